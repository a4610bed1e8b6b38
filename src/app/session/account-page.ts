import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButtonToggleModule } from '@angular/material/button-toggle';
import { MatSlideToggle } from '@angular/material/slide-toggle';
import { PageHeading } from '../ui/page-focus.ts';
import { Appearance, DENSITIES, SCHEMES, type Density, type Scheme } from './appearance.ts';
import { ChangeEmail } from './change-email.ts';
import { ChangePassword } from './change-password.ts';
import { OwnSessions } from './own-sessions.ts';
import { SessionStore } from './session-store.ts';

/** The own account: who one is, password, sessions, and how this browser shows things. */
@Component({
  selector: 'app-account-page',
  imports: [
    ChangeEmail,
    ChangePassword,
    MatButtonToggleModule,
    MatSlideToggle,
    OwnSessions,
    PageHeading,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './account-page.html',
  styleUrl: './account-page.scss',
})
export class AccountPage {
  protected readonly appearance = inject(Appearance);
  protected readonly person = inject(SessionStore).person;

  protected readonly schemes: Record<Scheme, string> = {
    system: 'As the system',
    light: 'Light',
    dark: 'Dark',
  };
  protected readonly densities: Record<Density, string> = {
    comfortable: 'Comfortable',
    standard: 'Standard',
    tight: 'Tight',
  };
  protected readonly schemeKeys = SCHEMES;
  protected readonly densityKeys = DENSITIES;
}
