import { createTransport } from 'nodemailer';
import type { Logger } from 'pino';
import type { Letter } from '#server/emails/invitation.ts';

export type Mailer = { send(letter: Letter): Promise<boolean>; close(): void };

/** The person who invites waits for the answer; a post office that says nothing must not keep them. */
const PATIENCE = { connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 20_000 };

/** Sends by SMTP. A letter that cannot be sent is logged and reported as not mailed; the caller shows the link anyway. */
export function createMailer(smtpUrl: string, from: string, log: Logger): Mailer {
  const transport = createTransport({ url: smtpUrl, ...PATIENCE });
  return {
    async send(letter) {
      try {
        await transport.sendMail({ from, to: letter.to, subject: letter.subject, text: letter.text });
        return true;
      } catch (error) {
        log.error(
          { error: error instanceof Error ? error.message : String(error), subject: letter.subject },
          'a letter could not be sent',
        );
        return false;
      }
    },
    close: () => transport.close(),
  };
}
