import { Page } from '#src/components/page.tsx';
import { auditQuery } from '#src/features/shop/api/audit.ts';
import { AuditList } from '#src/features/shop/components/audit-list.tsx';
import { ShopTabs } from '#src/features/shop/components/shop-tabs.tsx';
import { queryClient } from '#src/lib/query-client.ts';

export const loader = () => queryClient.ensureInfiniteQueryData(auditQuery);

export function Component() {
  return (
    <Page title="Audit" sub="Who changed what, newest first. Nothing here can be changed.">
      <ShopTabs />
      <AuditList />
    </Page>
  );
}
