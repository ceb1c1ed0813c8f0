import { Page } from '#src/components/page.tsx';
import { SettingsFacts } from '#src/features/shop/components/settings-facts.tsx';
import { SettingsForm } from '#src/features/shop/components/settings-form.tsx';
import { ShopTabs } from '#src/features/shop/components/shop-tabs.tsx';
import { useMay, useShop } from '#src/lib/session.ts';

export function Component() {
  const shop = useShop();
  const mayEdit = useMay('shop:edit');
  return (
    <Page title="Shop" sub={shop.name}>
      <ShopTabs />
      {mayEdit ? <SettingsForm shop={shop} /> : <SettingsFacts shop={shop} />}
    </Page>
  );
}
