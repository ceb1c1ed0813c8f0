import type { ReactNode } from 'react';
import { barMassMg } from '#shared/domain/mass.ts';
import { billOf } from '#shared/domain/bill-of-stock.ts';
import type { Bar, PlanStock, PlanView } from '#shared/schemas/plans.ts';
import type { Shop } from '#shared/schemas/people.ts';
import {
  BOXES_A_LINE,
  MARGIN,
  PAPER,
  SHEET_FOOT,
  SHEET_HEAD,
  type BarBlock,
} from '#src/features/plans/hooks/print-sheets.ts';
import { formatHeat, formatTag, type Formats } from '#src/lib/formats.ts';

const CAUTION =
  'Guards in place, hold-down on, hands clear, short pieces by tool. Support long stock; the last piece falls or kicks. Lock out before changing blades or clearing a jam. Eye, ear, hand and foot protection. The maker’s plate on the machine governs, and the shop’s procedures and local law. Masses are nominal.';

type SheetProps = {
  view: PlanView;
  shop: Shop;
  printedAt: string;
  page: number;
  pages: number;
  children: ReactNode;
};

/** One sheet: who, what, when and which of how many stand on every one, so that a sheet found on the floor can be put back. */
function Sheet({ view, shop, printedAt, page, pages, children }: SheetProps) {
  const { plan } = view;
  const paper = PAPER[shop.paper];
  return (
    <section
      className="print-sheet relative mx-auto mb-6 break-after-page overflow-hidden bg-white text-black shadow-none"
      style={{
        width: `${paper.width}mm`,
        height: `${paper.height - 0.2}mm`,
        padding: `${MARGIN.top}mm ${MARGIN.right}mm ${MARGIN.bottom}mm ${MARGIN.left}mm`,
      }}
      aria-label={`Sheet ${page} of ${pages}`}
    >
      <header
        className="flex items-start justify-between border-b-2 border-black"
        style={{ height: `${SHEET_HEAD - 3}mm` }}
      >
        <div>
          <p className="font-head text-[6mm] leading-none font-semibold">
            Plan {plan.number} · {plan.name}
          </p>
          <p className="mt-[1mm] font-mono text-[2.9mm]">
            {plan.jobs.map(({ number }) => `job ${number}`).join(', ')} ·{' '}
            {plan.state === 'draft' ? 'DRAFT, not issued' : `${plan.state} at ${plan.stationName}`} · version{' '}
            {plan.version}
          </p>
        </div>
        <p className="text-right font-mono text-[2.9mm]">
          {shop.name}
          <br />
          printed {printedAt}
          <br />
          sheet <b>{page}</b> of <b>{pages}</b>
        </p>
      </header>
      <div style={{ paddingTop: '3mm' }}>{children}</div>
      <footer
        className="absolute flex items-center gap-[2mm] border-t border-black text-[2.5mm] leading-tight"
        style={{
          left: `${MARGIN.left}mm`,
          right: `${MARGIN.right}mm`,
          bottom: '6mm',
          height: `${SHEET_FOOT - 5}mm`,
        }}
      >
        <svg aria-hidden viewBox="0 0 10 9" style={{ width: '7mm', flex: 'none' }}>
          <path d="M5 0.6 9.6 8.6H0.4Z" fill="none" stroke="#000" strokeWidth="0.9" strokeLinejoin="round" />
          <path d="M5 3.2V6" stroke="#000" strokeWidth="1" />
          <circle cx="5" cy="7.3" r="0.6" />
        </svg>
        <span>{CAUTION}</span>
      </footer>
    </section>
  );
}

const cell = 'border-b border-black/40 py-[1mm] pr-[3mm]';
const head = 'border-b-[0.5mm] border-black py-[1mm] pr-[3mm] font-head text-[3.6mm] font-semibold';

/** What to bring to the station, before the first bar is marked. */
function PullList({ view, shop, formats }: { view: PlanView; shop: Shop; formats: Formats }) {
  const { length, mass } = formats;
  const bill = billOf(view.groups);
  const stockOf = (groupId: string, stockId: string): PlanStock | undefined =>
    view.groups.find(({ id }) => id === groupId)?.stock.find((stock) => stock.stockId === stockId);
  const drops = bill
    .filter(({ source }) => source === 'drop')
    .sort((a, b) =>
      (stockOf(a.groupId, a.stockId)?.drop?.slot ?? '').localeCompare(
        stockOf(b.groupId, b.stockId)?.drop?.slot ?? '',
      ),
    );
  const bars = bill.filter(({ source }) => source === 'new');
  const lift = (mg: number) => (mg > shop.handlingMassMg ? 'lift with help' : '');
  return (
    <>
      <h2 className="font-head text-[5mm] font-semibold">Pull from the rack</h2>
      {drops.length === 0 ? (
        <p className="text-[3.2mm]">No drop is used.</p>
      ) : (
        <table className="mb-[4mm] w-full border-collapse text-left font-mono text-[3.1mm]">
          <thead>
            <tr>
              {['', 'Slot', 'Tag', 'Section', 'Length', 'Heat', 'Mass'].map((text) => (
                <th key={text} className={head}>
                  {text}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {drops.map((line) => {
              const drop = stockOf(line.groupId, line.stockId)?.drop;
              return (
                <tr key={`${line.groupId}${line.stockId}`}>
                  <td className={cell}>☐</td>
                  <td className={`${cell} font-bold`}>{drop?.slot}</td>
                  <td className={`${cell} font-bold`}>{drop ? formatTag(drop.tag) : ''}</td>
                  <td className={cell}>
                    {line.section} {line.grade}
                  </td>
                  <td className={cell}>{length(line.lengthNm)}</td>
                  <td className={cell}>{formatHeat(drop?.heat ?? null)}</td>
                  <td className={cell}>
                    {mass(line.massMg)} {lift(line.massMg)}
                  </td>
                </tr>
              );
            })}
          </tbody>
        </table>
      )}
      <h2 className="font-head text-[5mm] font-semibold">Bring as stock lengths</h2>
      <table className="w-full border-collapse text-left font-mono text-[3.1mm]">
        <thead>
          <tr>
            {['', 'Bars', 'Section', 'Length', 'One bar', 'Together'].map((text) => (
              <th key={text} className={head}>
                {text}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {bars.map((line) => (
            <tr key={`${line.groupId}${line.stockId}`}>
              <td className={cell}>☐</td>
              <td className={`${cell} font-bold`}>{line.bars}</td>
              <td className={cell}>
                {line.section} {line.grade}
              </td>
              <td className={cell}>{length(line.lengthNm)}</td>
              <td className={cell}>
                {mass(line.massMg / line.bars)} {lift(line.massMg / line.bars)}
              </td>
              <td className={cell}>{mass(line.massMg)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </>
  );
}

type BlockProps = { block: BarBlock; bars: readonly Bar[]; shop: Shop; formats: Formats; drawing: ReactNode };

/** One layout: what the bar is, room to write its heat and true length, the drawing, the stops, and what is left. */
function Block({ block, bars, shop, formats, drawing }: BlockProps) {
  const { length, setting, mass } = formats;
  const { group, layout: index, runs } = block;
  const layout = group.result.layouts[index];
  const stock = group.stock.find(({ stockId }) => stockId === layout?.stockId);
  if (!layout || !stock) return null;
  const own = bars.filter((bar) => bar.groupId === group.id && bar.layout === index);
  const massMg = barMassMg(group.mgPerM, stock.lengthNm);
  const pieces = new Map(group.pieces.map((piece) => [piece.id, piece]));
  const boxes =
    own.length > 0
      ? own.map(
          ({ number, makesTag }) => `bar ${number}${makesTag === null ? '' : ` ${formatTag(makesTag)}`}`,
        )
      : Array.from({ length: layout.repeat }, (_, i) => `${i + 1}`);
  return (
    <article className="border-b border-black pb-[2mm]" style={{ height: `${block.height}mm` }}>
      <div className="flex items-baseline justify-between pt-[2.5mm]">
        <p className="font-head text-[4.6mm] font-semibold">
          {group.section} {group.grade}{' '}
          <span className="font-mono text-[3.1mm] font-normal">
            {stock.drop
              ? `drop ${formatTag(stock.drop.tag)} in ${stock.drop.slot}`
              : `new bar ${length(stock.lengthNm)}`}
          </span>
        </p>
        <p className="font-mono text-[3.1mm]">
          {mass(massMg)}
          {massMg > shop.handlingMassMg ? ', lift with help' : ''} ·{' '}
          {group.request.cutting.kerfNm === 0
            ? 'shear, no kerf'
            : `kerf ${length(group.request.cutting.kerfNm)}`}
        </p>
      </div>
      <p className="mt-[1.5mm] flex gap-[4mm] font-mono text-[2.9mm]">
        <span className="flex-1 border-b border-black/60">
          {stock.drop ? formatHeat(stock.drop.heat) : 'heat'}
        </span>
        <span className="flex-1 border-b border-black/60">bar measured</span>
        <span className="flex-1 border-b border-black/60">cut by</span>
      </p>
      <p
        className="mt-[1mm] grid font-mono text-[2.6mm]"
        style={{
          gridTemplateColumns: `repeat(${own.some(({ makesTag }) => makesTag !== null) ? BOXES_A_LINE / 2 : BOXES_A_LINE}, minmax(0, 1fr))`,
        }}
      >
        {boxes.map((text) => (
          <span key={text}>☐ {text}</span>
        ))}
      </p>
      {drawing}
      <table className="w-full border-collapse text-left font-mono text-[3.3mm]">
        <thead>
          <tr>
            {['Cut', 'Stop', 'Mark', 'Tape from the datum end', 'One piece'].map((text) => (
              <th key={text} className="border-b border-black pr-[3mm] font-head text-[3.2mm] font-semibold">
                {text}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {runs.map((run) => (
            <tr key={run.first} className="align-top">
              <td className="pr-[3mm]">
                {run.count === 1 ? run.first : `${run.first}–${run.first + run.count - 1}`}
              </td>
              <td className="pr-[3mm] text-[4.2mm] leading-[5mm] font-bold whitespace-nowrap">
                {setting(run.lengthNm)}
              </td>
              <td className="pr-[3mm] text-[4.2mm] leading-[5mm] font-bold">
                {pieces.get(run.pieceId)?.mark}
              </td>
              <td className="pr-[3mm]">{run.tapesNm.map((nm) => length(nm)).join('  ')}</td>
              <td>{mass(pieces.get(run.pieceId)?.pieceMassMg ?? 0)}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <p className="mt-[1.5mm] font-mono text-[3.1mm]">
        {layout.leftoverNm === 0 ? (
          'Nothing is left.'
        ) : layout.keeps ? (
          <>
            <b>Keep {length(layout.leftoverNm)}</b> as a drop, tag{' '}
            {own.length === 1 && typeof own[0]?.makesTag === 'number' ? (
              <b>{formatTag(own[0].makesTag)}</b>
            ) : own.length > 1 ? (
              'as ticked above'
            ) : (
              '________'
            )}
            , slot ________, heat as the bar
          </>
        ) : (
          `${length(layout.leftoverNm)} left: scrap`
        )}
      </p>
    </article>
  );
}

type PrintSheetsProps = {
  view: PlanView;
  shop: Shop;
  formats: Formats;
  printedAt: string;
  sheets: readonly (readonly BarBlock[])[];
  drawingOf: (block: BarBlock) => ReactNode;
};

/** Cover with the pull list, then the bar maps. */
export function PrintSheets({ view, shop, formats, printedAt, sheets, drawingOf }: PrintSheetsProps) {
  const pages = sheets.length + 1;
  return (
    <>
      <style>{`@page { size: ${PAPER[shop.paper].css} portrait; margin: 0 } @media print { .print-sheet { margin: 0 !important } html, body { background: #fff } }`}</style>
      <Sheet {...{ view, shop, printedAt, pages }} page={1}>
        <PullList view={view} shop={shop} formats={formats} />
      </Sheet>
      {sheets.map((blocks, i) => (
        <Sheet key={i} {...{ view, shop, printedAt, pages }} page={i + 2}>
          {blocks.map((block) => (
            <Block
              key={`${block.group.id}${block.layout}`}
              block={block}
              bars={view.bars}
              shop={shop}
              formats={formats}
              drawing={drawingOf(block)}
            />
          ))}
        </Sheet>
      ))}
    </>
  );
}
