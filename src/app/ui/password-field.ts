import { ChangeDetectionStrategy, Component, input, signal } from '@angular/core';
import { ReactiveFormsModule, type FormControl } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Icon } from './icon.ts';
import { fieldError } from './schema-validator.ts';

/** A password field that can be read while typing; its label stands outside, tied by `fieldId`. */
@Component({
  selector: 'app-password-field',
  imports: [Icon, MatFormFieldModule, MatInput, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<mat-form-field>
    <input
      matInput
      [id]="fieldId()"
      [type]="shown() ? 'text' : 'password'"
      [autocomplete]="autocomplete()"
      [formControl]="control()"
      autocapitalize="none"
      spellcheck="false"
    />
    <button
      matSuffix
      type="button"
      class="show"
      [attr.aria-label]="shown() ? 'Hide password' : 'Show password'"
      [attr.aria-pressed]="shown()"
      (click)="shown.set(!shown())"
    >
      <app-icon [name]="shown() ? 'eye-off' : 'eye'" [size]="20" />
    </button>
    @if (hint()) {
      <mat-hint>{{ hint() }}</mat-hint>
    }
    <mat-error>{{ error(control()) }}</mat-error>
  </mat-form-field>`,
  styles: `
    mat-form-field {
      width: 100%;
    }

    .show {
      display: grid;
      place-items: center;
      width: 32px;
      height: 32px;
      margin-right: 8px;
      border: 0;
      border-radius: var(--app-radius-field);
      background: none;
      color: var(--mat-sys-on-surface-variant);
      cursor: pointer;
    }
  `,
})
export class PasswordField {
  readonly fieldId = input.required<string>();
  readonly control = input.required<FormControl<string>>();
  readonly autocomplete = input.required<'current-password' | 'new-password'>();
  readonly hint = input('');

  protected readonly shown = signal(false);
  protected readonly error = fieldError;
}
