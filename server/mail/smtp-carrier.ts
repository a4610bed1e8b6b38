import { createTransport, type Transporter } from 'nodemailer';
import type { Carrier } from './carrier.ts';
import type { Letter } from './letter.ts';

const ADDRESS = /^[^\s@<>()[\],;:"\\]+@[A-Za-z0-9.-]+$/;
const TIMEOUT_MS = 15_000;

/** Sends by SMTP, to one address at a time, given as an object: a string would be parsed as a list. */
export class SmtpCarrier implements Carrier {
  readonly #transport: Transporter;

  constructor(
    smtpUrl: string,
    private readonly from: string,
  ) {
    const { protocol, hostname, port, username, password } = new URL(smtpUrl);
    const secure = protocol === 'smtps:';
    this.#transport = createTransport({
      ...{ host: hostname, port: Number(port) || (secure ? 465 : 587), secure },
      ...(username && {
        auth: { user: decodeURIComponent(username), pass: decodeURIComponent(password) },
      }),
      ...{ connectionTimeout: TIMEOUT_MS, greetingTimeout: TIMEOUT_MS, socketTimeout: TIMEOUT_MS },
      ...{ disableFileAccess: true, disableUrlAccess: true },
    });
  }

  async carry(id: string, letter: Letter): Promise<void> {
    const to = { name: oneLine(letter.toName), address: checked(letter.toAddress) };
    await this.#transport.sendMail({
      ...{ from: { name: 'Sinkwell', address: checked(this.from) }, to },
      envelope: { from: checked(this.from), to: [to.address] },
      messageId: `<${id}@${this.from.split('@')[1] ?? 'localhost'}>`,
      ...{ subject: oneLine(letter.subject), text: letter.text },
      ...{ disableFileAccess: true, disableUrlAccess: true },
    });
  }
}

/** @throws {Error} for anything but one plain address */
function checked(address: string): string {
  if (!ADDRESS.test(address)) throw new Error('not a mail address');
  return address;
}

function oneLine(text: string): string {
  return text.replace(/\s+/g, ' ');
}
