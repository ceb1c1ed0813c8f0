import { useSuspenseQueries } from '@tanstack/react-query';
import { useState } from 'react';
import { Button } from '#src/components/button.tsx';
import { Page } from '#src/components/page.tsx';
import { offersQuery } from '#src/features/buying/api/offers.ts';
import { suppliersQuery } from '#src/features/buying/api/suppliers.ts';
import { BuyingTabs } from '#src/features/buying/components/buying-tabs.tsx';
import { Suppliers } from '#src/features/buying/components/suppliers.tsx';
import { queryClient } from '#src/lib/query-client.ts';
import { useMay } from '#src/lib/session.ts';

export const loader = () =>
  Promise.all([queryClient.ensureQueryData(offersQuery), queryClient.ensureQueryData(suppliersQuery)]);

export function Component() {
  const [offers, suppliers] = useSuspenseQueries({ queries: [offersQuery, suppliersQuery] });
  const mayEdit = useMay('supplier:edit');
  const [adding, setAdding] = useState(false);
  return (
    <Page
      title="Suppliers"
      sub="Who sells bar to this shop."
      actions={
        mayEdit && (
          <Button variant="act" onClick={() => setAdding(true)}>
            Add a supplier
          </Button>
        )
      }
    >
      <BuyingTabs />
      <Suppliers
        suppliers={suppliers.data.suppliers}
        offers={offers.data.offers}
        mayEdit={mayEdit}
        adding={adding}
        onAddingChange={setAdding}
      />
    </Page>
  );
}
