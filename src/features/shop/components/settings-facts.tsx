import type { Shop } from '#shared/schemas/people.ts';
import { Facts } from '#src/components/facts.tsx';
import { Notice } from '#src/components/notice.tsx';
import { useFormats } from '#src/lib/formats.ts';
import { SCRAP_UNIT, scrapPerUnit } from '#src/features/shop/hooks/shop-units.ts';

/** The settings for those who may not change them. */
export function SettingsFacts({ shop }: { shop: Shop }) {
  const { mass, money } = useFormats();
  return (
    <div className="max-w-3xl">
      <Facts
        facts={[
          { label: 'Name of the shop', value: shop.name },
          {
            label: 'Lengths and masses',
            value: shop.units === 'imperial' ? 'feet, inches, lb' : 'millimetres, kg',
          },
          ...(shop.units === 'imperial'
            ? [{ label: 'Smallest inch fraction printed', value: `1/${shop.inchDenominator}"`, mono: true }]
            : []),
          { label: 'Currency', value: shop.currency, mono: true },
          { label: 'Paper in the printer', value: shop.paper === 'a4' ? 'A4' : 'Letter' },
          { label: 'Handling mass: lift with help above it', value: mass(shop.handlingMassMg), mono: true },
          {
            label: `The scrap dealer pays, ${SCRAP_UNIT[shop.units]}`,
            value: money(scrapPerUnit(shop.scrapMinorPerTonne, shop.units)),
            mono: true,
          },
        ]}
      />
      <Notice className="mt-6">A manager of the shop can change these.</Notice>
    </div>
  );
}
