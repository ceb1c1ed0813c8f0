import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Button } from '#src/components/button.tsx';
import { Page } from '#src/components/page.tsx';
import { stationsQuery } from '#src/features/shop/api/stations.ts';
import { ShopTabs } from '#src/features/shop/components/shop-tabs.tsx';
import { StationList } from '#src/features/shop/components/station-list.tsx';
import { queryClient } from '#src/lib/query-client.ts';
import { useMay } from '#src/lib/session.ts';

export const loader = () => queryClient.ensureQueryData(stationsQuery);

export function Component() {
  const { stations } = useSuspenseQuery(stationsQuery).data;
  const mayEdit = useMay('station:edit');
  const [adding, setAdding] = useState(false);
  return (
    <Page
      title="Stations"
      sub="What cuts in this shop and what every cut takes off the bar."
      actions={
        mayEdit && (
          <Button variant="act" onClick={() => setAdding(true)}>
            Add a station
          </Button>
        )
      }
    >
      <ShopTabs />
      <StationList stations={stations} mayEdit={mayEdit} adding={adding} onAddingChange={setAdding} />
    </Page>
  );
}
