import { Tabs } from '#src/components/tabs.tsx';
import { useMay, useSession } from '#src/lib/session.ts';
import { paths } from '#src/lib/paths.ts';

/** The pages of the shop this person may see; the local mailbox only while mail stays on this machine. */
export function ShopTabs() {
  const { trial } = useSession();
  const people = useMay('person:read');
  const mail = useMay('mail:read') && trial;
  const audit = useMay('audit:read');
  return (
    <Tabs
      label="Shop"
      tabs={[
        { to: paths.shop(), label: 'Settings' },
        { to: paths.stations(), label: 'Stations' },
        { to: paths.dropRules(), label: 'Drop rules' },
        ...(people ? [{ to: paths.people(), label: 'People' }] : []),
        ...(mail ? [{ to: paths.mail(), label: 'Mail' }] : []),
        ...(audit ? [{ to: paths.audit(), label: 'Audit' }] : []),
      ]}
    />
  );
}
