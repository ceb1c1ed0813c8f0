import { useSuspenseInfiniteQuery } from '@tanstack/react-query';
import { Button } from '#src/components/button.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Fault } from '#src/components/fault.tsx';
import { Table } from '#src/components/table.tsx';
import { faultWords } from '#src/lib/api-error.ts';
import { useFormats } from '#src/lib/formats.ts';
import { auditQuery } from '#src/features/shop/api/audit.ts';
import { auditWords } from '#src/features/shop/hooks/audit-words.ts';

/** Who did what and when, newest first. */
export function AuditList() {
  const formats = useFormats();
  const { time } = formats;
  const audit = useSuspenseInfiniteQuery(auditQuery);
  const entries = audit.data.pages.flatMap((page) => page.entries);
  if (entries.length === 0)
    return (
      <EmptyState title="Nothing written yet">
        Every change to the shop&rsquo;s records will stand here.
      </EmptyState>
    );
  return (
    <>
      <Table
        caption="Changes, newest first"
        rows={entries}
        rowKey={(entry) => entry.id}
        columns={[
          {
            key: 'at',
            head: 'When',
            mono: true,
            className: 'sm:whitespace-nowrap',
            cell: (entry) => time(entry.at),
          },
          { key: 'who', head: 'Who', className: 'sm:whitespace-nowrap', cell: (entry) => entry.who },
          { key: 'action', head: 'What', mono: true, cell: (entry) => entry.action },
          { key: 'subject', head: 'Of what', mono: true, cell: (entry) => entry.subject },
          {
            key: 'detail',
            fullLine: true,
            head: 'Detail',
            className: 'sm:min-w-56',
            cell: (entry) => (
              <span className="text-[0.9375rem] break-words text-muted">
                {auditWords(entry.detail, formats)}
              </span>
            ),
          },
        ]}
      />
      {audit.isFetchNextPageError && (
        <Fault {...faultWords(audit.error)} className="mt-4" onRetry={() => void audit.fetchNextPage()} />
      )}
      {audit.hasNextPage && (
        <Button
          className="mt-5"
          busy={audit.isFetchingNextPage}
          busyLabel="Loading"
          onClick={() => void audit.fetchNextPage()}
        >
          Earlier entries
        </Button>
      )}
    </>
  );
}
