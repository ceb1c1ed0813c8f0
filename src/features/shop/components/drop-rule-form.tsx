import { Controller } from 'react-hook-form';
import { NM_PER_FOOT, NM_PER_M } from '#shared/domain/units.ts';
import { DropRuleInput, type DropRule } from '#shared/schemas/yard.ts';
import { Button } from '#src/components/button.tsx';
import { LengthField } from '#src/components/length-field.tsx';
import { LengthTape } from '#src/components/length-tape.tsx';
import { Notice } from '#src/components/notice.tsx';
import { NumberField } from '#src/components/number-field.tsx';
import { useFormats } from '#src/lib/formats.ts';
import { useEditForm } from '#src/lib/use-edit-form.ts';
import { useDropRuleWrites } from '#src/features/shop/api/drop-rules.ts';

type Form = Omit<DropRuleInput, 'keepFromNm' | 'creditPercent'> & {
  keepFromNm: number | null;
  creditPercent: number | null;
};

type DropRuleFormProps = { rule: DropRule; onSaved: () => void };

export function DropRuleForm({ rule, onSaved }: DropRuleFormProps) {
  const { length, lengthStyle, units } = useFormats();
  const writes = useDropRuleWrites();
  const { form, onSubmit, fault, saving, errors } = useEditForm<Form, DropRuleInput, DropRule, unknown>({
    schema: DropRuleInput,
    thing: rule,
    toForm: (current) => ({ ...current }),
    fields: ['keepFromNm', 'creditPercent'],
    save: writes.save,
    reload: () => writes.reload(rule.family),
    onSaved,
  });
  const keepFromNm = form.watch('keepFromNm');
  /** The tape shows a usual bar, longer only when the rule reaches past it. */
  const barNm = Math.max(units === 'metric' ? 6 * NM_PER_M : 20 * NM_PER_FOOT, keepFromNm ?? 0);

  return (
    <form noValidate onSubmit={onSubmit} className="grid gap-5">
      <Controller
        control={form.control}
        name="keepFromNm"
        render={({ field }) => (
          <LengthField
            label="Keep drops from"
            hint="What is left of a bar and at least this long is tagged and racked. Shorter goes to scrap."
            lengthStyle={lengthStyle}
            value={field.value}
            onChange={field.onChange}
            onBlur={field.onBlur}
            error={errors.keepFromNm?.message}
          />
        )}
      />
      <LengthTape
        label={keepFromNm === null ? 'No length to keep from' : `Drops are kept from ${length(keepFromNm)}`}
        lengthNm={barNm}
        units={units}
        marks={
          keepFromNm === null
            ? []
            : [{ key: 'keep', at: keepFromNm, kind: 'keep', label: `keep from ${length(keepFromNm)}` }]
        }
      />
      <Controller
        control={form.control}
        name="creditPercent"
        render={({ field }) => (
          <NumberField
            label="A kept drop is worth"
            unit="%"
            max={100}
            hint="Of the cheapest offer's price for the same length. A plan weighs it against cutting the bar up."
            value={field.value}
            onChange={field.onChange}
            onBlur={field.onBlur}
            error={errors.creditPercent?.message}
          />
        )}
      />
      {fault && (
        <Notice tone="fault" live>
          {fault}
        </Notice>
      )}
      <div>
        <Button type="submit" variant="act" busy={saving} busyLabel="Saving">
          Save rule
        </Button>
      </div>
    </form>
  );
}
