import { LINK_PAGES } from '../../shared/contract/account.ts';
import type { Letter } from './letter.ts';

interface Reader {
  readonly name: string;
  readonly email: string;
}

/** The token stands behind the #: browsers send that part to no server and in no referrer. */
function link(origin: string, page: string, token: string): string {
  return `${origin}/${page}#${token}`;
}

export function invitation(origin: string, to: Reader, workspace: string, token: string): Letter {
  return letter(to, `Invitation to Sinkwell of ${workspace}`, [
    `You have been invited to Sinkwell of ${workspace}. Set your password here, within 24 hours:`,
    link(origin, LINK_PAGES.invitation, token),
  ]);
}

export function passwordReset(origin: string, to: Reader, token: string): Letter {
  return letter(to, 'Set a new password for Sinkwell', [
    'Set a new password here, within 10 minutes:',
    link(origin, LINK_PAGES.passwordReset, token),
    'If you did not ask for this, leave it: your password stays as it is.',
  ]);
}

export function emailChange(origin: string, to: Reader, newEmail: string, token: string): Letter {
  return letter(to, 'Confirm the new e-mail address for Sinkwell', [
    `Your account is about to move to ${newEmail}. It does once the links sent to the old and the new address have both been opened, within an hour:`,
    link(origin, LINK_PAGES.emailChange, token),
    'If you did not ask for this, do not open the link and change your password.',
  ]);
}

export function passwordChanged(to: Reader): Letter {
  return letter(to, 'Your Sinkwell password has been changed', [
    'Your password has been changed and all other sessions have been ended.',
    'If this was not you, ask for a password reset at once and tell your administrator.',
  ]);
}

function letter(to: Reader, subject: string, paragraphs: readonly string[]): Letter {
  const text = [`Hello ${to.name},`, ...paragraphs].join('\n\n');
  return { toName: to.name, toAddress: to.email, subject, text: `${text}\n` };
}
