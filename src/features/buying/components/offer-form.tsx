import { Controller } from 'react-hook-form';
import { readGrade } from '#shared/domain/grade.ts';
import { barMassMg } from '#shared/domain/mass.ts';
import { sectionByName } from '#shared/domain/section/section-by-name.ts';
import { usualLengthsNm } from '#shared/domain/section/usual-lengths.ts';
import { asNm } from '#shared/domain/units.ts';
import { OfferInput, type Offer, type Supplier } from '#shared/schemas/yard.ts';
import { Button } from '#src/components/button.tsx';
import { LengthField } from '#src/components/length-field.tsx';
import { MoneyField } from '#src/components/money-field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { SectionField } from '#src/components/section-field.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { useFormats } from '#src/lib/formats.ts';
import { useEditForm } from '#src/lib/use-edit-form.ts';
import { useOfferWrites } from '#src/features/buying/api/offers.ts';
import { pricePerMass, pricePerMassUnit } from '#src/features/buying/hooks/price-per-mass.ts';

type Form = {
  supplierId: number;
  section: string | null;
  grade: string;
  lengthNm: number | null;
  priceMinor: number | null;
  version?: number;
};

type OfferFormProps = {
  offer: Offer | null;
  suppliers: readonly Supplier[];
  onSaved: (offer: Offer) => void;
};

export function OfferForm({ offer, suppliers, onSaved }: OfferFormProps) {
  const formats = useFormats();
  const { length, mass, lengthStyle, currency, units } = formats;
  const writes = useOfferWrites();
  const { form, onSubmit, fault, saving, errors } = useEditForm<Form, OfferInput, Offer | null, Offer>({
    schema: OfferInput,
    thing: offer,
    toForm: (current) =>
      current
        ? {
            supplierId: current.supplierId,
            section: current.section,
            grade: current.grade,
            lengthNm: current.lengthNm,
            priceMinor: current.priceMinor,
            version: current.version,
          }
        : { supplierId: suppliers[0]?.id ?? 0, section: null, grade: '', lengthNm: null, priceMinor: null },
    fields: ['supplierId', 'section', 'grade', 'lengthNm', 'priceMinor'],
    save: (input) => writes.save(offer?.id ?? null, input),
    ...(offer ? { reload: () => writes.reload(offer.id) } : {}),
    onSaved,
  });
  const [sectionName, lengthNm, priceMinor] = form.watch(['section', 'lengthNm', 'priceMinor']);
  const section = sectionName === null ? null : sectionByName(sectionName);
  const barMg =
    section?.mass.per === 'length' && lengthNm !== null
      ? barMassMg(section.mass.mgPerM, asNm(lengthNm))
      : null;

  return (
    <form noValidate onSubmit={onSubmit} className="grid gap-5">
      <SelectField
        label="Supplier"
        choices={suppliers.map((supplier) => ({ value: String(supplier.id), label: supplier.name }))}
        error={errors.supplierId?.message}
        {...form.register('supplierId', { valueAsNumber: true })}
      />
      <div className="grid gap-5 sm:grid-cols-2">
        <Controller
          control={form.control}
          name="section"
          render={({ field }) => (
            <SectionField
              label="Section"
              hint={
                units === 'imperial' ? 'As you would write it: L3x3x1/4' : 'As you would write it: L 50x50x5'
              }
              units={units}
              value={field.value}
              onChange={field.onChange}
              onBlur={field.onBlur}
              error={errors.section?.message}
            />
          )}
        />
        <TextField
          label="Grade"
          mono
          autoComplete="off"
          hint="Leave empty when the supplier names none."
          error={errors.grade?.message}
          {...form.register('grade', {
            onBlur: () => form.setValue('grade', readGrade(form.getValues('grade')).grade),
          })}
        />
      </div>
      <div className="grid gap-5 sm:grid-cols-2">
        <div>
          <Controller
            control={form.control}
            name="lengthNm"
            render={({ field }) => (
              <LengthField
                label="Length of one bar"
                hint={units === 'imperial' ? "A bare number is inches: write 20' for feet." : undefined}
                lengthStyle={lengthStyle}
                value={field.value}
                onChange={field.onChange}
                onBlur={field.onBlur}
                error={errors.lengthNm?.message}
              />
            )}
          />
          {section && (
            <div className="mt-2 flex flex-wrap gap-2">
              {usualLengthsNm(section).map((nm) => (
                <Button
                  key={nm}
                  size="small"
                  className="font-mono"
                  onClick={() => form.setValue('lengthNm', nm, { shouldValidate: true })}
                >
                  {length(nm)}
                </Button>
              ))}
            </div>
          )}
        </div>
        <Controller
          control={form.control}
          name="priceMinor"
          render={({ field }) => (
            <MoneyField
              label="Price of one bar"
              currency={currency}
              value={field.value}
              onChange={field.onChange}
              onBlur={field.onBlur}
              error={errors.priceMinor?.message}
            />
          )}
        />
      </div>
      <p role="status" className="min-h-6 font-mono text-muted">
        {barMg !== null && `one bar ${mass(barMg)}`}
        {barMg !== null &&
          priceMinor !== null &&
          ` · ${pricePerMass(priceMinor, barMg, units, currency)} ${pricePerMassUnit(units, currency)}`}
      </p>
      {fault && (
        <Notice tone="fault" live>
          {fault}
        </Notice>
      )}
      <div>
        <Button type="submit" variant="act" busy={saving} busyLabel="Saving">
          Save offer
        </Button>
      </div>
    </form>
  );
}
