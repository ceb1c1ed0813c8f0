import { useEffect, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { ArrowLeft } from 'lucide-react';

type PageProps = {
  title: string;
  /** What stands in the window's title bar, when the heading is not plain text enough. */
  windowTitle?: string;
  sub?: ReactNode;
  /** Buttons at the right of the heading; at most one of them is an `act`. */
  actions?: ReactNode;
  back?: { to: string; label: string };
  children?: ReactNode;
};

/** One page, one job: heading, what it is about, what can be done, then the work itself. */
export function Page({ title, windowTitle, sub, actions, back, children }: PageProps) {
  useEffect(() => {
    document.title = `${windowTitle ?? title} · Barwright`;
  }, [title, windowTitle]);
  return (
    <div className="px-4 pt-5 pb-10 sm:px-6 lg:px-9 lg:pt-7">
      {back && (
        <Link
          to={back.to}
          className="mb-2 inline-flex min-h-11 items-center gap-1.5 font-head text-[1.0625rem] font-medium text-layout underline-offset-4 hover:underline"
        >
          <ArrowLeft aria-hidden size={17} /> {back.label}
        </Link>
      )}
      <div className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
        <div className="min-w-0">
          <h1 className="break-words">{title}</h1>
          {sub && <div className="mt-1 text-muted">{sub}</div>}
        </div>
        {actions && <div className="flex flex-wrap items-center gap-3 print:hidden">{actions}</div>}
      </div>
      <div className="mt-5">{children}</div>
    </div>
  );
}
