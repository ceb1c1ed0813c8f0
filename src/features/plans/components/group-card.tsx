import { useState } from 'react';
import type { GroupEdits } from '#shared/domain/plan-request.ts';
import type { PlanningView } from '#shared/schemas/plans.ts';
import type { Station } from '#shared/schemas/yard.ts';
import { Button } from '#src/components/button.tsx';
import { LengthField } from '#src/components/length-field.tsx';
import { MoneyField } from '#src/components/money-field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { countOf, formatHeat, formatTag, useFormats } from '#src/lib/formats.ts';

type Group = PlanningView['groups'][number];
type GroupCardProps = {
  group: Group;
  edits: GroupEdits;
  stations: readonly Station[];
  stationId: number | null;
  onChange: (edits: GroupEdits, stationId?: number | null) => void;
};

const check = 'size-5 shrink-0';

/** Stock, drops, allowances and the rule for drops of one section and grade: sensible as they come, all of it open to change. */
export function GroupCard({ group, edits, stations, stationId, onChange }: GroupCardProps) {
  const { length, money, currency, lengthStyle, mass } = useFormats();
  const longest = Math.max(...group.pieces.map(({ lengthNm }) => lengthNm));
  const used = edits.stock.filter((entry) => entry.used);
  const nothing = used.length === 0 && !edits.drops.some((drop) => drop.used);
  const tooShort = !nothing && used.every(({ lengthNm }) => lengthNm < longest);
  const set = (changes: Partial<GroupEdits>) => onChange({ ...edits, ...changes });
  const pieces = group.pieces.reduce((sum, { quantity }) => sum + quantity, 0);
  const massMg = group.pieces.reduce((sum, { quantity, pieceMassMg }) => sum + quantity * pieceMassMg, 0);
  const station = stations.find(({ id }) => id === stationId);
  return (
    <section
      aria-label={`${group.section} ${group.grade}`}
      className="mb-5 border-[1.5px] border-ink bg-chalk"
    >
      <header className="flex flex-wrap items-baseline gap-x-4 gap-y-1 border-b border-line px-4 py-2.5">
        <h3 className="font-mono text-xl font-bold">
          {group.section} <span className="font-medium">{group.grade}</span>
        </h3>
        <p className="text-muted">
          {countOf(pieces, 'piece', 'pieces')}, longest <span className="font-mono">{length(longest)}</span>,{' '}
          <span className="font-mono">{mass(massMg)}</span>
        </p>
        <label className="ml-auto flex items-center gap-2">
          <input
            type="checkbox"
            className={check}
            checked={!edits.leftOut}
            onChange={(event) => set({ leftOut: !event.target.checked })}
          />
          plan it
        </label>
      </header>
      {!edits.leftOut && (
        <div className="grid gap-x-8 gap-y-4 px-4 py-3 lg:grid-cols-[minmax(0,3fr)_minmax(0,3fr)_minmax(0,2fr)]">
          <div>
            <h4 className="font-head text-base font-semibold">Stock lengths to buy</h4>
            {edits.stock.map((entry, i) => {
              const offer = group.offers.find(({ stockId }) => stockId === entry.stockId);
              return (
                <div key={entry.stockId} className="flex items-center gap-3 border-b border-line py-1.5">
                  <label className="flex min-w-0 flex-1 items-center gap-2">
                    <input
                      type="checkbox"
                      className={check}
                      checked={entry.used}
                      onChange={(event) =>
                        set({
                          stock: edits.stock.map((other, j) =>
                            i === j ? { ...other, used: event.target.checked } : other,
                          ),
                        })
                      }
                    />
                    <span className="min-w-0">
                      <span className="font-mono font-bold">{length(entry.lengthNm)}</span>{' '}
                      <span className="text-sm text-muted">{offer?.supplierName ?? 'typed in'}</span>
                    </span>
                  </label>
                  <MoneyField
                    label={`Price of a bar of ${length(entry.lengthNm)}`}
                    hideLabel
                    className="w-32"
                    currency={currency}
                    value={entry.costMinor}
                    onChange={(costMinor) =>
                      costMinor !== null &&
                      set({
                        stock: edits.stock.map((other, j) => (i === j ? { ...other, costMinor } : other)),
                      })
                    }
                  />
                </div>
              );
            })}
            {nothing && (
              <Notice tone="fault" className="mt-2">
                No stock to cut from. Add a length with its price, or tick one; without it these pieces stay
                unplaced.
              </Notice>
            )}
            {tooShort && (
              <Notice tone="fault" className="mt-2">
                The longest piece is longer than any length ticked. Add a longer one, or it stays unplaced.
              </Notice>
            )}
            <AddLength
              group={group}
              edits={edits}
              onAdd={(entry) => set({ stock: [...edits.stock, entry] })}
            />
          </div>
          <div>
            <h4 className="font-head text-base font-semibold">Drops on the rack that fit</h4>
            {edits.drops.length === 0 ? (
              <p className="py-1.5 text-muted">None of this section and grade is long enough.</p>
            ) : (
              edits.drops.map((entry, i) => {
                const drop = group.drops.find(({ stockId }) => stockId === entry.stockId);
                return (
                  <label key={entry.stockId} className="flex items-center gap-2 border-b border-line py-1.5">
                    <input
                      type="checkbox"
                      className={check}
                      checked={entry.used}
                      onChange={(event) =>
                        set({
                          drops: edits.drops.map((other, j) =>
                            i === j ? { ...other, used: event.target.checked } : other,
                          ),
                        })
                      }
                    />
                    <span className="min-w-0 flex-1 font-mono text-[0.9375rem]">
                      <b>{drop ? formatTag(drop.tag) : entry.stockId}</b> {length(entry.lengthNm)} ·{' '}
                      {drop?.slot} · {formatHeat(drop?.heat ?? null)}
                    </span>
                    <span className="font-mono text-[0.9375rem]">{money(entry.costMinor)}</span>
                  </label>
                );
              })
            )}
          </div>
          <details className="min-w-0">
            <summary className="font-head text-base font-semibold">
              {station?.name ?? 'No station'}:{' '}
              {edits.cutting.kerfNm === 0 ? 'no kerf' : `kerf ${length(edits.cutting.kerfNm)}`}; keep drops
              from {length(edits.rule.keepFromNm)}
            </summary>
            <div className="mt-3 grid gap-3">
              <SelectField
                label="Allowances of"
                value={stationId === null ? '' : String(stationId)}
                placeholder="no station"
                choices={stations.map(({ id, name }) => ({ value: String(id), label: name }))}
                onChange={(event) => {
                  const next = stations.find(({ id }) => String(id) === event.target.value);
                  const { kerfNm, headCropNm, tailCropNm, holdDownNm } = next ?? edits.cutting;
                  onChange(
                    { ...edits, cutting: { kerfNm, headCropNm, tailCropNm, holdDownNm } },
                    next?.id ?? null,
                  );
                }}
              />
              {(
                [
                  ['kerfNm', 'Kerf a cut (a shear has none)'],
                  ['headCropNm', 'Crop at the datum end'],
                  ['tailCropNm', 'Crop at the far end'],
                  ['holdDownNm', 'Hold-down needs'],
                ] as const
              ).map(([key, label]) => (
                <LengthField
                  key={key}
                  label={label}
                  allowZero
                  lengthStyle={lengthStyle}
                  value={edits.cutting[key]}
                  onChange={(nm) => nm !== null && set({ cutting: { ...edits.cutting, [key]: nm } })}
                />
              ))}
              <LengthField
                label="Keep drops from"
                lengthStyle={lengthStyle}
                value={edits.rule.keepFromNm}
                onChange={(nm) => nm !== null && set({ rule: { ...edits.rule, keepFromNm: nm } })}
              />
              <MoneyField
                label="A kept drop is worth, a metre"
                currency={currency}
                value={edits.rule.creditMinorPerM}
                onChange={(minor) =>
                  minor !== null && set({ rule: { ...edits.rule, creditMinorPerM: minor } })
                }
              />
              <MoneyField
                label="Scrap is worth, a metre"
                currency={currency}
                value={edits.rule.scrapMinorPerM}
                onChange={(minor) =>
                  minor !== null && set({ rule: { ...edits.rule, scrapMinorPerM: minor } })
                }
              />
            </div>
          </details>
        </div>
      )}
    </section>
  );
}

type AddLengthProps = {
  group: Group;
  edits: GroupEdits;
  onAdd: (entry: GroupEdits['stock'][number]) => void;
};

/** A length nobody has offered yet, with the price the planner expects. */
function AddLength({ group, edits, onAdd }: AddLengthProps) {
  const { length, currency, lengthStyle } = useFormats();
  const [open, setOpen] = useState(edits.stock.length === 0);
  const [lengthNm, setLengthNm] = useState<number | null>(group.usualLengthsNm[0] ?? null);
  const [costMinor, setCostMinor] = useState<number | null>(null);
  if (!open)
    return (
      <Button size="small" variant="quiet" className="mt-1 -ml-3" onClick={() => setOpen(true)}>
        Add a length
      </Button>
    );
  return (
    <div className="mt-2 flex flex-wrap items-end gap-3">
      <LengthField
        label="Length"
        className="w-36"
        lengthStyle={lengthStyle}
        value={lengthNm}
        onChange={setLengthNm}
        hint={`Usual: ${group.usualLengthsNm
          .slice(0, 4)
          .map((nm) => length(nm))
          .join(', ')}`}
      />
      <MoneyField
        label="Price a bar"
        className="w-32"
        currency={currency}
        value={costMinor}
        onChange={setCostMinor}
      />
      <Button
        size="small"
        disabled={lengthNm === null || costMinor === null || costMinor === 0}
        onClick={() => {
          if (lengthNm === null || costMinor === null) return;
          const taken = edits.stock.filter(({ stockId }) => stockId.startsWith('length:')).length;
          onAdd({ stockId: `length:${taken + 1}`, lengthNm, costMinor, used: true });
          setOpen(false);
        }}
      >
        Add
      </Button>
    </div>
  );
}
