import { once } from 'node:events';
import { SMTPServer } from 'smtp-server';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { SmtpCarrier } from '../../../server/mail/smtp-carrier.ts';
import { Outbox } from '../../../server/mail/outbox.ts';
import { OutgoingMailEntity } from '../../../server/mail/outgoing-mail-entity.ts';
import { queueLetter } from '../../../server/mail/queue-letter.ts';
import { createLogger } from '../../../server/http/request-log.ts';
import { TestServer } from '../test-server.ts';

interface Received {
  readonly recipients: readonly string[];
  readonly text: string;
}

describe('mail by SMTP', () => {
  let smtp: SMTPServer;
  let received: Received[];
  let carrier: SmtpCarrier;
  beforeEach(async () => {
    received = [];
    smtp = new SMTPServer({
      ...{ disabledCommands: ['STARTTLS'], authOptional: true },
      onData: (stream, { envelope }, done) => {
        let text = '';
        stream.on('data', (chunk: Buffer) => (text += chunk.toString()));
        stream.on('end', () => {
          received.push({ recipients: envelope.rcptTo.map(({ address }) => address), text });
          done();
        });
      },
    });
    smtp.listen(0, '127.0.0.1');
    await once(smtp.server, 'listening');
    const { port } = smtp.server.address() as { port: number };
    carrier = new SmtpCarrier(`smtp://127.0.0.1:${port}`, 'sinkwell@works.example');
  });
  afterEach(async () => {
    await new Promise<void>((resolve) => {
      smtp.close(resolve);
    });
  });

  const letter = {
    toName: 'Dora',
    toAddress: 'dora@works.example',
    subject: 'Hello',
    text: 'Body\n',
  };

  it('S-37: reaches the one person meant, with a message id that stays', async () => {
    await carrier.carry('id-1', letter);
    expect(received[0]!.recipients).toEqual(['dora@works.example']);
    expect(received[0]!.text).toMatch(/^To: Dora <dora@works\.example>$/m);
    expect(received[0]!.text).toMatch(/^Message-ID: <id-1@works\.example>$/m);
  });

  it.each([
    ...[
      'a@x.test\r\nBcc:evil@x.test',
      'a@x.test\nevil@x.test',
      'g: evil@x.test;',
      'a@x.test,evil@x.test',
    ],
    ...['a@x.test;evil@x.test', '<evil@x.test>', '"a" <evil@x.test>', 'a@x.test evil@x.test', ''],
    ...[
      'evil@x.test>',
      '(c)evil@x.test',
      'a@[evil]',
      'a\\@x.test',
      'a@x.test\0',
      'a@@x.test',
      'ä@x.test:1',
    ],
  ])('S-37: sends nothing to %j', async (toAddress) => {
    await expect(carrier.carry('id', { ...letter, toAddress })).rejects.toThrow(
      'not a mail address',
    );
    expect(received).toEqual([]);
  });

  it.each([
    ...[
      'Dora\r\nBcc: evil@x.test',
      'Dora <evil@x.test>',
      'evil@x.test,',
      '"; evil@x.test',
      'a: evil@x.test;',
    ],
    ...['=?utf-8?Q?=0D=0ABcc:evil@x.test?=', 'Dora\u2028Bcc: evil@x.test', 'x'.repeat(2000)],
  ])('S-37: takes the name and subject %j for text', async (hostile) => {
    await carrier.carry('id', { ...letter, toName: hostile, subject: hostile });
    expect(received[0]!.recipients).toEqual(['dora@works.example']);
    expect(received[0]!.text).not.toMatch(/^Bcc:/im);
    const head = received[0]!.text.split('\r\n\r\n')[0]!;
    const names = [...head.matchAll(/^([\w-]+):/gm)].map(([, name]) => name);
    expect(names).toEqual([
      ...[
        'From',
        'To',
        'Subject',
        'Message-ID',
        'Content-Transfer-Encoding',
        'Date',
        'MIME-Version',
      ],
      'Content-Type',
    ]);
  });
});

describe('the outbox', () => {
  let server: TestServer;
  beforeEach(async () => {
    server = await TestServer.start();
  });
  afterEach(() => server.stop());

  const letter = {
    toName: 'Dora',
    toAddress: 'dora@works.example',
    subject: 'Hi',
    text: 'secret link',
  };
  const rows = () => server.database.read((m) => m.find(OutgoingMailEntity));

  it('sends nothing of a transaction that failed, and everything of one that did not', async () => {
    await expect(
      server.database.transaction(async (manager) => {
        await queueLetter(manager, letter, server.nowMs);
        throw new Error('later');
      }),
    ).rejects.toThrow();
    expect(await server.mails()).toEqual([]);
    await server.database.transaction((m) => queueLetter(m, letter, server.nowMs));
    expect(await server.mails()).toMatchObject([{ subject: 'Hi', text: 'secret link' }]);
    expect(await rows()).toMatchObject([{ text: '', attempts: 1, nextAttemptAtMs: null }]);
  });

  it('R-29: tries again after 1 min, doubling to 1 h, and gives up after 48 h', async () => {
    const ids: string[] = [];
    const carrier = {
      carry: (id: string) => {
        ids.push(id);
        return Promise.reject(new Error('450 try later'));
      },
    };
    const logger = createLogger('silent');
    const outbox = new Outbox(server.database, carrier, () => server.nowMs, logger);
    await server.database.transaction((m) => queueLetter(m, letter, server.nowMs));
    const waitsMin: number[] = [];
    for (;;) {
      outbox.wake();
      await outbox.settled();
      const next = (await rows())[0]!.nextAttemptAtMs;
      if (next === null) break;
      waitsMin.push((next - server.nowMs) / 60_000);
      server.pass(next - server.nowMs);
    }
    expect(waitsMin.slice(0, 8)).toEqual([1, 2, 4, 8, 16, 32, 60, 60]);
    expect(waitsMin.length).toBeGreaterThan(50);
    expect(new Set(ids).size).toBe(1);
    expect((await rows())[0]!.text).toBe('');
  });
});
