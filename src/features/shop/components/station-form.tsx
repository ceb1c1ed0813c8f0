import { Controller } from 'react-hook-form';
import { FAMILIES, PLATE_FAMILIES, type Family } from '#shared/domain/section/types.ts';
import { StationInput, type Station } from '#shared/schemas/yard.ts';
import { Button } from '#src/components/button.tsx';
import { CheckField } from '#src/components/check-field.tsx';
import { ChipField } from '#src/components/chip-field.tsx';
import { LengthField } from '#src/components/length-field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextAreaField, TextField } from '#src/components/text-field.tsx';
import { FAMILY_WORDS } from '#src/lib/family-words.ts';
import { useFormats } from '#src/lib/formats.ts';
import { useEditForm } from '#src/lib/use-edit-form.ts';
import { useStationWrites } from '#src/features/shop/api/stations.ts';

type Form = Omit<StationInput, 'kerfNm' | 'headCropNm' | 'tailCropNm' | 'holdDownNm'> & {
  kerfNm: number | null;
  headCropNm: number | null;
  tailCropNm: number | null;
  holdDownNm: number | null;
};

const BLANK: Form = {
  name: '',
  method: 'saw',
  kerfNm: null,
  headCropNm: 0,
  tailCropNm: 0,
  holdDownNm: 0,
  longestStopNm: null,
  families: [],
  note: '',
};

function toForm(station: Station | null): Form {
  if (!station) return BLANK;
  const { id: _id, can: _can, ...form } = station;
  return form;
}

const METHODS = [
  { value: 'shear', label: 'Shear' },
  { value: 'saw', label: 'Saw' },
  { value: 'thermal', label: 'Torch or plasma' },
] as const;

const ALLOWANCES = [
  { name: 'headCropNm', label: 'Head crop', hint: 'Squares the first end; its own cut included.' },
  { name: 'tailCropNm', label: 'Tail crop', hint: 'Squares the far end.' },
  { name: 'holdDownNm', label: 'Hold-down', hint: 'Shortest end the hold-down still grips.' },
] as const;

type StationFormProps = { station: Station | null; onSaved: (station: Station) => void };

export function StationForm({ station, onSaved }: StationFormProps) {
  const { lengthStyle } = useFormats();
  const writes = useStationWrites();
  const { form, onSubmit, fault, saving, errors } = useEditForm<Form, StationInput, Station | null, Station>({
    schema: StationInput,
    thing: station,
    toForm,
    fields: [
      'name',
      'method',
      'kerfNm',
      'headCropNm',
      'tailCropNm',
      'holdDownNm',
      'longestStopNm',
      'families',
      'note',
    ],
    save: (input) => writes.save(station?.id ?? null, input),
    ...(station ? { reload: () => writes.reload(station.id) } : {}),
    onSaved,
  });
  const method = form.watch('method');

  return (
    <form noValidate onSubmit={onSubmit} className="grid gap-5">
      <TextField
        label="Name"
        hint="As it is called on the floor."
        error={errors.name?.message}
        {...form.register('name')}
      />
      <Controller
        control={form.control}
        name="method"
        render={({ field }) => (
          <ChipField
            label="It cuts by"
            value={field.value}
            onChange={(value) => {
              field.onChange(value);
              if (value === 'shear') form.setValue('kerfNm', 0);
              else if (form.getValues('kerfNm') === 0) form.setValue('kerfNm', null);
            }}
            choices={METHODS}
          />
        )}
      />
      <div className="grid gap-5 sm:grid-cols-2">
        <Controller
          control={form.control}
          name="kerfNm"
          render={({ field }) => (
            <LengthField
              label="Kerf"
              allowZero
              disabled={method === 'shear'}
              hint={method === 'shear' ? 'A shear parts the bar without kerf.' : 'Steel lost in every cut.'}
              lengthStyle={lengthStyle}
              value={field.value}
              onChange={field.onChange}
              onBlur={field.onBlur}
              error={errors.kerfNm?.message}
            />
          )}
        />
        {ALLOWANCES.map((allowance) => (
          <Controller
            key={allowance.name}
            control={form.control}
            name={allowance.name}
            render={({ field }) => (
              <LengthField
                label={allowance.label}
                hint={allowance.hint}
                allowZero
                lengthStyle={lengthStyle}
                value={field.value}
                onChange={field.onChange}
                onBlur={field.onBlur}
                error={errors[allowance.name]?.message}
              />
            )}
          />
        ))}
        <Controller
          control={form.control}
          name="longestStopNm"
          render={({ field }) => (
            <LengthField
              label="Longest stop"
              hint="Leave empty when any length can be set."
              lengthStyle={lengthStyle}
              value={field.value}
              onChange={field.onChange}
              onBlur={field.onBlur}
              error={errors.longestStopNm?.message}
            />
          )}
        />
      </div>
      <Controller
        control={form.control}
        name="families"
        render={({ field }) => (
          <fieldset className="m-0 border-0 p-0">
            <legend className="p-0 font-head text-base font-semibold text-muted">Cuts these</legend>
            <div className="grid grid-cols-2 gap-x-4 sm:grid-cols-3">
              {FAMILIES.filter((family) => !PLATE_FAMILIES.includes(family)).map((family: Family) => (
                <CheckField
                  key={family}
                  label={FAMILY_WORDS[family]}
                  checked={field.value.includes(family)}
                  onChange={(event) =>
                    field.onChange(
                      event.target.checked
                        ? [...field.value, family]
                        : field.value.filter((kept) => kept !== family),
                    )
                  }
                />
              ))}
            </div>
            {errors.families?.message && (
              <p role="alert" className="font-medium text-oxide">
                {errors.families.message}
              </p>
            )}
          </fieldset>
        )}
      />
      <TextAreaField
        label="Note"
        hint="What the maker's plate allows, which grip, whom to ask. The plate on the machine governs."
        error={errors.note?.message}
        {...form.register('note')}
      />
      {fault && (
        <Notice tone="fault" live>
          {fault}
        </Notice>
      )}
      <div>
        <Button type="submit" variant="act" busy={saving} busyLabel="Saving">
          Save station
        </Button>
      </div>
    </form>
  );
}
