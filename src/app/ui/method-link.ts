import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { PRE } from '../../../shared/checks/criteria.ts';
import { Icon } from './icon.ts';

/** The small way from a criterion to its paragraph on the method page. */
@Component({
  selector: 'app-method-link',
  imports: [Icon, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<a
    routerLink="/method"
    [fragment]="paragraph()"
    [title]="'Method'"
    [attr.aria-label]="name() + ', method'"
    ><app-icon name="book" [size]="14"
  /></a>`,
  styles: `
    a {
      display: inline-grid;
      place-items: center;
      width: 24px;
      height: 24px;
      border-radius: 6px;
      color: var(--mat-sys-on-surface-variant);

      &:hover {
        background: var(--app-raised);
      }
    }
  `,
})
export class MethodLink {
  readonly criterionId = input.required<string>();
  /** The criterion’s name, for who hears the link. */
  readonly name = input.required<string>();

  /** The transistor in front is asked the same as any other. */
  protected readonly paragraph = computed(() => this.criterionId().replace(PRE, ''));
}
