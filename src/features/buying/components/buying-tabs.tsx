import { Tabs } from '#src/components/tabs.tsx';
import { paths } from '#src/lib/paths.ts';

export function BuyingTabs() {
  return (
    <Tabs
      label="Buying"
      tabs={[
        { to: paths.buying(), label: 'Offers' },
        { to: paths.suppliers(), label: 'Suppliers' },
      ]}
    />
  );
}
