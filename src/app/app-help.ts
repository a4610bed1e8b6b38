import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialogModule } from '@angular/material/dialog';
import { RouterLink } from '@angular/router';
import { Appearance } from './session/appearance.ts';

/** Help of every page: where the method is explained, and the keys. */
@Component({
  selector: 'app-help',
  imports: [MatButton, MatDialogModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './app-help.html',
  styles: `
    dl {
      display: grid;
      grid-template-columns: 64px 1fr;
      gap: 8px;
      margin: 8px 0 16px;
    }
  `,
})
export class Help {
  protected readonly shortcuts = inject(Appearance).shortcuts;
}
