import { useSuspenseQueries } from '@tanstack/react-query';
import { useState } from 'react';
import { Button } from '#src/components/button.tsx';
import { Page } from '#src/components/page.tsx';
import { offersQuery } from '#src/features/buying/api/offers.ts';
import { suppliersQuery } from '#src/features/buying/api/suppliers.ts';
import { BuyingTabs } from '#src/features/buying/components/buying-tabs.tsx';
import { Offers } from '#src/features/buying/components/offers.tsx';
import { queryClient } from '#src/lib/query-client.ts';
import { useMay } from '#src/lib/session.ts';

export const loader = () =>
  Promise.all([queryClient.ensureQueryData(offersQuery), queryClient.ensureQueryData(suppliersQuery)]);

export function Component() {
  const [offers, suppliers] = useSuspenseQueries({ queries: [offersQuery, suppliersQuery] });
  const mayEdit = useMay('offer:edit');
  const [adding, setAdding] = useState(false);
  return (
    <Page
      title="Offers"
      windowTitle="Buying"
      sub="What a bar costs, by section, grade and length. Plans choose among these."
      actions={
        mayEdit &&
        suppliers.data.suppliers.length > 0 && (
          <Button variant="act" onClick={() => setAdding(true)}>
            Add an offer
          </Button>
        )
      }
    >
      <BuyingTabs />
      <Offers
        offers={offers.data.offers}
        suppliers={suppliers.data.suppliers}
        mayEdit={mayEdit}
        adding={adding}
        onAddingChange={setAdding}
      />
    </Page>
  );
}
