import { useMemo } from 'react';
import { Controller } from 'react-hook-form';
import { ShopInput, type Shop } from '#shared/schemas/people.ts';
import { Button } from '#src/components/button.tsx';
import { ChipField } from '#src/components/chip-field.tsx';
import { MoneyField } from '#src/components/money-field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { NumberField } from '#src/components/number-field.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { useToast } from '#src/components/toast.tsx';
import { currencyChoices } from '#src/lib/currencies.ts';
import { useEditForm } from '#src/lib/use-edit-form.ts';
import { useShopSettings } from '#src/features/shop/api/shop-settings.ts';
import {
  MASS_UNIT,
  SCRAP_UNIT,
  massToUnits,
  scrapPerTonne,
  scrapPerUnit,
  unitsToMass,
} from '#src/features/shop/hooks/shop-units.ts';

type Form = Omit<ShopInput, 'handlingMassMg' | 'scrapMinorPerTonne'> & {
  handlingMassMg: number | null;
  scrapMinorPerTonne: number | null;
};

/** A whole tonne by hand is a slip of the pen. */
const MOST_HANDLING_MASS = 2_000;

export function SettingsForm({ shop }: { shop: Shop }) {
  const say = useToast();
  const { save, reload } = useShopSettings();
  const currencies = useMemo(() => currencyChoices(), []);
  const { form, onSubmit, fault, saving, errors } = useEditForm<Form, ShopInput, Shop, Shop>({
    schema: ShopInput,
    thing: shop,
    toForm: (current) => ({ ...current }),
    fields: ['name', 'units', 'inchDenominator', 'currency', 'paper', 'handlingMassMg', 'scrapMinorPerTonne'],
    save,
    reload,
    onSaved: (saved) => {
      form.reset({ ...saved });
      say('The settings are saved.');
    },
  });
  const [units, currency] = form.watch(['units', 'currency']);

  return (
    <form noValidate onSubmit={onSubmit} className="grid max-w-3xl gap-6">
      <TextField label="Name of the shop" error={errors.name?.message} {...form.register('name')} />
      <div className="grid gap-6 sm:grid-cols-2">
        <Controller
          control={form.control}
          name="units"
          render={({ field }) => (
            <ChipField
              label="Lengths and masses"
              value={field.value}
              onChange={field.onChange}
              choices={[
                { value: 'imperial', label: 'feet, inches, lb' },
                { value: 'metric', label: 'millimetres, kg' },
              ]}
            />
          )}
        />
        <Controller
          control={form.control}
          name="inchDenominator"
          render={({ field }) => (
            <ChipField
              label="Smallest inch fraction printed"
              mono
              disabled={units === 'metric'}
              value={String(field.value)}
              onChange={(value) => field.onChange(Number(value))}
              choices={[
                { value: '16', label: '1/16"' },
                { value: '32', label: '1/32"' },
                { value: '64', label: '1/64"' },
              ]}
            />
          )}
        />
        <SelectField
          label="Currency"
          choices={currencies}
          error={errors.currency?.message}
          {...form.register('currency')}
        />
        <Controller
          control={form.control}
          name="paper"
          render={({ field }) => (
            <ChipField
              label="Paper in the printer"
              value={field.value}
              onChange={field.onChange}
              choices={[
                { value: 'letter', label: 'Letter' },
                { value: 'a4', label: 'A4' },
              ]}
            />
          )}
        />
        <Controller
          control={form.control}
          name="handlingMassMg"
          render={({ field }) => (
            <NumberField
              label="Handling mass"
              unit={MASS_UNIT[units]}
              min={1}
              max={MOST_HANDLING_MASS}
              value={field.value === null ? null : massToUnits(field.value, units)}
              onChange={(whole) => field.onChange(whole === null ? null : unitsToMass(whole, units))}
              onBlur={field.onBlur}
              hint="Bench and sheets say “lift with help” above it."
              error={errors.handlingMassMg?.message}
            />
          )}
        />
        <Controller
          control={form.control}
          name="scrapMinorPerTonne"
          render={({ field }) => (
            <MoneyField
              key={`${currency} ${units}`}
              label={`The scrap dealer pays, ${SCRAP_UNIT[units]}`}
              currency={currency}
              value={field.value === null ? null : scrapPerUnit(field.value, units)}
              onChange={(minor) => field.onChange(minor === null ? null : scrapPerTonne(minor, units))}
              onBlur={field.onBlur}
              hint="A plan credits scrap with it. 0 when it is given away."
              error={errors.scrapMinorPerTonne?.message}
            />
          )}
        />
      </div>
      {fault && (
        <Notice tone="fault" live>
          {fault}
        </Notice>
      )}
      <div>
        <Button type="submit" variant="act" busy={saving} busyLabel="Saving">
          Save settings
        </Button>
      </div>
    </form>
  );
}
