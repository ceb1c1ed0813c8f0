import { useSuspenseQuery } from '@tanstack/react-query';
import { Page } from '#src/components/page.tsx';
import { dropRulesQuery } from '#src/features/shop/api/drop-rules.ts';
import { DropRuleList } from '#src/features/shop/components/drop-rule-list.tsx';
import { ShopTabs } from '#src/features/shop/components/shop-tabs.tsx';
import { queryClient } from '#src/lib/query-client.ts';
import { useMay } from '#src/lib/session.ts';

export const loader = () => queryClient.ensureQueryData(dropRulesQuery);

export function Component() {
  const { rules } = useSuspenseQuery(dropRulesQuery).data;
  const mayEdit = useMay('drop-rule:edit');
  return (
    <Page title="Drop rules" sub="From which length a leftover is worth a tag and a place on the rack.">
      <ShopTabs />
      <DropRuleList rules={rules} mayEdit={mayEdit} />
    </Page>
  );
}
