import type { AddressInfo } from 'node:net';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import { write } from '#server/database.ts';
import { Mail } from '#server/models/index.ts';

export type LocalMailbox = { readonly smtpUrl: string; close(): Promise<void> };

/** The trial's post office: a real SMTP server on this machine that keeps what it is handed, for a manager to read. */
export async function openLocalMailbox(): Promise<LocalMailbox> {
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    size: 1_000_000,
    onData(stream, session, done) {
      simpleParser(stream)
        .then((letter) =>
          write(() =>
            Mail.create({
              sender: letter.from?.text ?? '',
              recipient: session.envelope.rcptTo.map(({ address }) => address).join(', '),
              subject: letter.subject ?? '',
              text: letter.text ?? '',
              at: new Date().toISOString(),
            }),
          ),
        )
        .then(
          () => done(),
          (error: unknown) => done(error instanceof Error ? error : new Error(String(error))),
        );
    },
  });
  const listening = server.listen(0, '127.0.0.1');
  await new Promise<void>((ready, failed) => {
    listening.once('listening', ready);
    listening.once('error', failed);
  });
  const { port } = listening.address() as AddressInfo;
  return {
    smtpUrl: `smtp://127.0.0.1:${port}`,
    close: () => new Promise((done) => server.close(() => done())),
  };
}
