import { createTransport } from 'nodemailer';
import type { Logger } from 'pino';
import type { Letter } from '#server/emails/invitation.ts';

export type Mailer = { send(letter: Letter): Promise<boolean>; close(): void };

/** Sends by SMTP. A letter that cannot be sent is logged and reported as not mailed; the caller shows the link anyway. */
export function createMailer(smtpUrl: string, from: string, log: Logger): Mailer {
  const transport = createTransport(smtpUrl);
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
