import { useQuery, useSuspenseQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { Busy } from '#src/components/busy.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Fault } from '#src/components/fault.tsx';
import { Page } from '#src/components/page.tsx';
import { letterQuery, mailQuery } from '#src/features/shop/api/mail.ts';
import { Letter } from '#src/features/shop/components/letter.tsx';
import { MailList } from '#src/features/shop/components/mail-list.tsx';
import { ShopTabs } from '#src/features/shop/components/shop-tabs.tsx';
import { faultWords } from '#src/lib/api-error.ts';
import { queryClient } from '#src/lib/query-client.ts';

export const loader = () => queryClient.ensureQueryData(mailQuery);

export function Component() {
  const { mails } = useSuspenseQuery(mailQuery).data;
  const [search] = useSearchParams();
  const asked = Number(search.get('mail'));
  const chosen = mails.find((mail) => mail.id === asked)?.id ?? mails[0]?.id ?? null;
  const letter = useQuery({ ...letterQuery(chosen ?? 0), enabled: chosen !== null });
  return (
    <Page
      title="Mail"
      sub="In a trial no e-mail leaves this machine. What would have been sent can be read here."
    >
      <ShopTabs />
      {chosen === null ? (
        <EmptyState title="No mail yet">
          Invite somebody under People: the invitation will lie here.
        </EmptyState>
      ) : (
        <div className="grid gap-6 lg:grid-cols-[minmax(16rem,22rem)_1fr]">
          <MailList mails={mails} chosen={chosen} />
          {letter.data ? (
            <Letter mail={letter.data} />
          ) : letter.isError ? (
            <Fault {...faultWords(letter.error)} onRetry={() => void letter.refetch()} />
          ) : (
            <Busy label="Opening the letter" />
          )}
        </div>
      )}
    </Page>
  );
}
