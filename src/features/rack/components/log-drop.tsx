import { useState } from 'react';
import { Controller } from 'react-hook-form';
import { readGrade } from '#shared/domain/grade.ts';
import { sectionByName } from '#shared/domain/section/section-by-name.ts';
import type { Drop, LogDropInput } from '#shared/schemas/rack.ts';
import type { DropRule } from '#shared/schemas/yard.ts';
import { Button } from '#src/components/button.tsx';
import { ChipField } from '#src/components/chip-field.tsx';
import { LengthField } from '#src/components/length-field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { SectionField } from '#src/components/section-field.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { useFormats } from '#src/lib/formats.ts';
import { useEditForm } from '#src/lib/use-edit-form.ts';
import { useLogDrop } from '#src/features/rack/api/drops.ts';
import { BLANK_DROP, LogDropFormSchema, type LogDropForm } from '#src/features/rack/hooks/log-drop-form.ts';

const OTHER = 'other';

type LogDropProps = {
  /** Sections lately racked, offered first. */
  recent: readonly { section: string; grade: string }[];
  rules: readonly DropRule[];
  /** Where the last drop went, typed once for a whole shelf. */
  lastSlot: string;
  onLogged: (drop: Drop) => void;
};

/** Ten seconds on a phone: section by one touch, length, slot, and the heat as it stands on the steel or "unknown". */
export function LogDrop({ recent, rules, lastSlot, onLogged }: LogDropProps) {
  const { length, lengthStyle, units } = useFormats();
  const log = useLogDrop();
  const [typing, setTyping] = useState(recent.length === 0);
  const { form, onSubmit, fault, saving, errors } = useEditForm<LogDropForm, LogDropInput, null, Drop>({
    schema: LogDropFormSchema,
    thing: null,
    toForm: () => ({ ...BLANK_DROP, slot: lastSlot }),
    fields: ['section', 'grade', 'lengthNm', 'widthNm', 'slot', 'heat', 'note'],
    save: log,
    onSaved: onLogged,
  });
  const [sectionName, lengthNm, heatKnown] = form.watch(['section', 'lengthNm', 'heatKnown']);
  const section = sectionName === null ? null : sectionByName(sectionName);
  const rule = rules.find(({ family }) => family === section?.family);
  const short = rule && lengthNm !== null && lengthNm < rule.keepFromNm;

  return (
    <form noValidate onSubmit={onSubmit} className="grid gap-5">
      <div>
        {recent.length > 0 && (
          <ChipField
            label="Section"
            mono
            value={typing ? OTHER : sectionName}
            onChange={(value) => {
              setTyping(value === OTHER);
              form.setValue('section', value === OTHER ? null : value, { shouldValidate: value !== OTHER });
              form.setValue('grade', recent.find((known) => known.section === value)?.grade ?? '');
            }}
            choices={[
              ...recent.map((known) => ({ value: known.section, label: known.section })),
              { value: OTHER, label: 'other…' },
            ]}
          />
        )}
        {typing && (
          <Controller
            control={form.control}
            name="section"
            render={({ field }) => (
              <SectionField
                className={recent.length > 0 ? 'mt-4' : undefined}
                label={recent.length > 0 ? 'Other section' : 'Section'}
                look="line"
                units={units}
                value={field.value}
                onChange={field.onChange}
                onBlur={field.onBlur}
                error={errors.section?.message}
              />
            )}
          />
        )}
        {!typing && errors.section?.message && (
          <p role="alert" className="mt-1 font-medium text-oxide">
            Choose a section.
          </p>
        )}
      </div>
      <Controller
        control={form.control}
        name="lengthNm"
        render={({ field }) => (
          <LengthField
            label="Length"
            look="line"
            lengthStyle={lengthStyle}
            value={field.value}
            onChange={field.onChange}
            onBlur={field.onBlur}
            error={errors.lengthNm?.message}
          />
        )}
      />
      {section?.mass.per === 'area' && (
        <Controller
          control={form.control}
          name="widthNm"
          render={({ field }) => (
            <LengthField
              label="Width"
              look="line"
              lengthStyle={lengthStyle}
              value={field.value}
              onChange={field.onChange}
              onBlur={field.onBlur}
              error={errors.widthNm?.message}
            />
          )}
        />
      )}
      <TextField
        label="Slot"
        look="line"
        mono
        autoComplete="off"
        autoCapitalize="characters"
        placeholder="B-3-2"
        error={errors.slot?.message}
        {...form.register('slot')}
      />
      <div className="grid gap-3">
        <Controller
          control={form.control}
          name="heatKnown"
          render={({ field }) => (
            <ChipField
              label="Heat"
              value={field.value}
              onChange={field.onChange}
              choices={[
                { value: 'read', label: 'read off the steel' },
                { value: 'unknown', label: 'unknown' },
              ]}
            />
          )}
        />
        {errors.heatKnown?.message && (
          <p role="alert" className="font-medium text-oxide">
            {errors.heatKnown.message}
          </p>
        )}
        {heatKnown === 'read' && (
          <TextField
            label="Heat as it stands on the steel"
            look="line"
            mono
            autoComplete="off"
            autoCapitalize="characters"
            error={errors.heat?.message}
            {...form.register('heat')}
          />
        )}
      </div>
      <div className="grid gap-5 sm:grid-cols-2">
        <TextField
          label="Grade"
          mono
          autoComplete="off"
          hint="Leave empty when unknown."
          error={errors.grade?.message}
          {...form.register('grade', {
            onBlur: () => form.setValue('grade', readGrade(form.getValues('grade')).grade),
          })}
        />
        <TextField
          label="Note"
          autoComplete="off"
          hint="Bent, rusted, one mitred end."
          error={errors.note?.message}
          {...form.register('note')}
        />
      </div>
      {rule && lengthNm !== null && (
        <Notice live>
          {short
            ? `Shorter than this shop keeps: from ${length(rule.keepFromNm)}. Rack it only if you know a use.`
            : `Keep: this shop keeps it from ${length(rule.keepFromNm)}.`}
        </Notice>
      )}
      {fault && (
        <Notice tone="fault" live>
          {fault}
        </Notice>
      )}
      <Button type="submit" variant="act" size="big" busy={saving} busyLabel="Racking it">
        Rack it
      </Button>
    </form>
  );
}
