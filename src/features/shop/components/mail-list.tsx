import { Link } from 'react-router-dom';
import type { MailSummary } from '#shared/schemas/people.ts';
import { classNames } from '#src/components/class-names.ts';
import { useFormats } from '#src/lib/formats.ts';
import { paths, withSearch } from '#src/lib/paths.ts';

export function MailList({ mails, chosen }: { mails: readonly MailSummary[]; chosen: number | null }) {
  const { ago } = useFormats();
  return (
    <ul className="m-0 grid list-none content-start p-0">
      {mails.map((mail) => (
        <li key={mail.id} className="border-b border-line">
          <Link
            to={withSearch(paths.mail(), { mail: mail.id })}
            aria-current={mail.id === chosen ? 'true' : undefined}
            className={classNames(
              'block border-l-4 px-3 py-2.5 hover:bg-soap',
              mail.id === chosen ? 'border-oxide bg-soap' : 'border-transparent',
            )}
          >
            <span className="block font-semibold">{mail.subject}</span>
            <span className="block text-[0.9375rem] break-all text-muted">
              to {mail.to} · {ago(mail.at)}
            </span>
          </Link>
        </li>
      ))}
    </ul>
  );
}
