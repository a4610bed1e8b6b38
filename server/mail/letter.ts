/** One mail to one person, as plain text. */
export interface Letter {
  readonly toName: string;
  readonly toAddress: string;
  readonly subject: string;
  readonly text: string;
}
