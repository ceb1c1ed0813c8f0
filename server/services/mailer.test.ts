import { pino } from 'pino';
import { expect, it } from 'vitest';
import { createMailer } from '#server/services/mailer.ts';

it('a letter that cannot be sent is said to be so, and its text stays out of the log', async () => {
  const logged: string[] = [];
  // Port 1 is reserved (tcpmux) and answers nowhere a test runs.
  const mailer = createMailer(
    'smtp://127.0.0.1:1',
    'Bars <bars@shop.example>',
    pino({}, { write: (line: string) => void logged.push(line) }),
  );
  expect(
    await mailer.send({
      to: 'nia@shop.example',
      subject: 'Your sign-in',
      text: 'https://bars.shop.example/join/secret',
    }),
  ).toBe(false);
  mailer.close();
  expect(logged.join('')).toContain('could not be sent');
  expect(logged.join('')).not.toContain('secret');
});
