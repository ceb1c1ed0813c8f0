import type { MailView } from '#shared/schemas/people.ts';
import { useFormats } from '#src/lib/formats.ts';

const ADDRESS = /(https?:\/\/\S+)/;

/** One e-mail as it would have arrived; addresses in it can be followed. */
export function Letter({ mail }: { mail: MailView }) {
  const { time } = useFormats();
  return (
    <article className="min-w-0 border-[1.5px] border-ink bg-chalk p-5">
      <h2>{mail.subject}</h2>
      <p className="mt-1 text-muted">
        from <span className="break-all">{mail.from}</span> to <span className="break-all">{mail.to}</span>,{' '}
        {time(mail.at)}
      </p>
      <p className="mt-4 break-words whitespace-pre-wrap">
        {mail.text.split(ADDRESS).map((part, i) =>
          i % 2 === 1 ? (
            <a key={i} href={part} className="break-all text-layout underline underline-offset-4">
              {part}
            </a>
          ) : (
            part
          ),
        )}
      </p>
    </article>
  );
}
