/** The plan as a workbook: Bars, Cuts, Bill, Drops. Numbers are numbers, units stand in the heads, and no text becomes a formula. */
import type { Workbook, Worksheet } from 'exceljs';
import { billOf } from '#shared/domain/bill-of-stock.ts';
import { barMassMg } from '#shared/domain/mass.ts';
import { minorPerUnit } from '#shared/domain/money.ts';
import { MG_PER_KG, MG_PER_LB, NM_PER_INCH, NM_PER_MM } from '#shared/domain/units.ts';
import type { Shop } from '#shared/schemas/people.ts';
import type { PlanView } from '#shared/schemas/plans.ts';
import { formatTag } from '#src/lib/formats.ts';

type Cell = string | number | null;
type Head = { readonly head: string; readonly width: number; readonly format?: string };

/** Spreadsheets run text that begins with one of these when it is pasted or saved as CSV; a leading apostrophe keeps it text (CWE-1236). */
const safeText = (text: string): string => (/^[=+\-@\t\r\n]/.test(text) ? `'${text}` : text);

function addSheet(
  book: Workbook,
  name: string,
  heads: readonly Head[],
  rows: readonly (readonly Cell[])[],
): Worksheet {
  const sheet = book.addWorksheet(name, { views: [{ state: 'frozen', ySplit: 1 }] });
  sheet.columns = heads.map(({ head, width, format }) => ({
    header: head,
    width,
    ...(format ? { style: { numFmt: format } } : {}),
  }));
  for (const row of rows) sheet.addRow(row.map((cell) => (typeof cell === 'string' ? safeText(cell) : cell)));
  sheet.getRow(1).font = { bold: true };
  sheet.autoFilter = { from: { row: 1, column: 1 }, to: { row: 1, column: heads.length } };
  return sheet;
}

/** Fills a workbook; the caller brings it, so that the library is fetched only when somebody exports. */
export function fillPlanWorkbook(
  book: Workbook,
  { plan, groups, bars }: PlanView,
  shop: Pick<Shop, 'units' | 'currency' | 'name'>,
): void {
  const imperial = shop.units === 'imperial';
  const [lengthUnit, massUnit] = imperial ? ['in', 'lb'] : ['mm', 'kg'];
  const length = (nm: number) => nm / (imperial ? NM_PER_INCH : NM_PER_MM);
  const mass = (mg: number) => Math.round((mg / (imperial ? MG_PER_LB : MG_PER_KG)) * 1000) / 1000;
  const money = (minor: number) => minor / minorPerUnit(shop.currency);
  const text = (head: string, width: number): Head => ({ head, width });
  const lengthHead = (words: string): Head => ({
    head: `${words} (${lengthUnit})`,
    width: 15,
    format: imperial ? '0.0000' : '0.0',
  });
  const massHead = (words: string): Head => ({ head: `${words} (${massUnit})`, width: 13, format: '0.00' });
  const moneyHead = (words: string): Head => ({
    head: `${words} (${shop.currency})`,
    width: 15,
    format: '#,##0.00',
  });
  const count = (head: string): Head => ({ head, width: 9, format: '0' });
  book.creator = 'Barwright';
  book.title = `Plan ${plan.number}`;

  const each = groups.flatMap((group) =>
    group.result.layouts.map((layout, i) => ({
      group,
      layout,
      i,
      stock: group.stock.find(({ stockId }) => stockId === layout.stockId),
    })),
  );
  addSheet(
    book,
    'Bars',
    [
      count('Layout'),
      text('Section', 16),
      text('Grade', 10),
      count('Repeat'),
      text('Stock', 10),
      text('Tag', 9),
      text('Slot', 9),
      lengthHead('Bar length'),
      massHead('Bar mass'),
      count('Pieces'),
      lengthHead('Left over'),
      text('Left over is', 12),
      text('Drop tags made', 20),
    ],
    each.map(({ group, layout, i, stock }, n) => [
      n + 1,
      group.section,
      group.grade,
      layout.repeat,
      stock?.source === 'drop' ? 'drop' : 'new bar',
      stock?.drop ? formatTag(stock.drop.tag) : '',
      stock?.drop?.slot ?? '',
      length(stock?.lengthNm ?? 0),
      mass(barMassMg(group.mgPerM, stock?.lengthNm ?? 0)),
      layout.cuts.length,
      length(layout.leftoverNm),
      layout.leftoverNm === 0 ? 'nothing' : layout.keeps ? 'drop' : 'scrap',
      bars
        .filter((bar) => bar.groupId === group.id && bar.layout === i && bar.makesTag !== null)
        .map(({ makesTag }) => formatTag(makesTag ?? 0))
        .join(', '),
    ]),
  );
  addSheet(
    book,
    'Cuts',
    [
      count('Layout'),
      count('Cut'),
      text('Section', 16),
      text('Grade', 10),
      text('Mark', 16),
      text('Job', 10),
      text('Part list', 20),
      count('Row'),
      lengthHead('Stop'),
      lengthHead('Tape'),
      massHead('Piece mass'),
      count('Repeat'),
    ],
    each.flatMap(({ group, layout }, n) =>
      layout.cuts.map((cut, k): Cell[] => {
        const piece = group.pieces.find(({ id }) => id === cut.pieceId);
        return [
          n + 1,
          k + 1,
          group.section,
          group.grade,
          piece?.mark ?? '',
          piece?.jobNumber ?? '',
          piece?.partListName ?? '',
          piece?.row ?? null,
          length(cut.lengthNm),
          length(cut.startNm + cut.lengthNm),
          mass(piece?.pieceMassMg ?? 0),
          layout.repeat,
        ];
      }),
    ),
  );
  addSheet(
    book,
    'Bill',
    [
      text('Section', 16),
      text('Grade', 10),
      text('Supplier', 24),
      lengthHead('Length'),
      count('Bars'),
      massHead('Mass'),
      moneyHead('Price a bar'),
      moneyHead('Cost'),
    ],
    billOf(groups)
      .filter(({ source }) => source === 'new')
      .map((line): Cell[] => {
        const stock = groups
          .find(({ id }) => id === line.groupId)
          ?.stock.find(({ stockId }) => stockId === line.stockId);
        return [
          line.section,
          line.grade,
          stock?.supplierName ?? 'typed in',
          length(line.lengthNm),
          line.bars,
          mass(line.massMg),
          money(stock?.costMinor ?? 0),
          money(line.costMinor),
        ];
      }),
  );
  addSheet(
    book,
    'Drops',
    [
      text('Drop', 10),
      text('Tag', 9),
      text('Section', 16),
      text('Grade', 10),
      lengthHead('Length'),
      massHead('Mass'),
      text('Slot', 9),
      text('Heat', 14),
    ],
    [
      ...each.flatMap(({ group, stock }): Cell[][] =>
        stock?.drop
          ? [
              [
                'to pull',
                formatTag(stock.drop.tag),
                group.section,
                group.grade,
                length(stock.lengthNm),
                mass(barMassMg(group.mgPerM, stock.lengthNm)),
                stock.drop.slot,
                stock.drop.heat ?? 'unknown',
              ],
            ]
          : [],
      ),
      ...each.flatMap(({ group, layout, i, stock }): Cell[][] => {
        if (!layout.keeps) return [];
        const made = bars.filter((bar) => bar.groupId === group.id && bar.layout === i);
        return Array.from({ length: layout.repeat }, (_, k): Cell[] => {
          const bar = made[k];
          return [
            'to make',
            typeof bar?.makesTag !== 'number' ? '' : formatTag(bar.makesTag),
            group.section,
            group.grade,
            length(layout.leftoverNm),
            mass(barMassMg(group.mgPerM, layout.leftoverNm)),
            bar?.madeDrop?.slot ?? '',
            bar?.heat ?? stock?.drop?.heat ?? 'unknown',
          ];
        });
      }),
    ],
  );
}

/** Makes the file and hands it to the browser. */
export async function downloadPlanWorkbook(view: PlanView, shop: Shop): Promise<void> {
  const { Workbook: Book } = (await import('exceljs')).default;
  const book = new Book();
  fillPlanWorkbook(book, view, shop);
  const bytes = await book.xlsx.writeBuffer();
  const link = document.createElement('a');
  link.href = URL.createObjectURL(
    new Blob([bytes], { type: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet' }),
  );
  link.download = `plan-${view.plan.number}.xlsx`;
  link.click();
  setTimeout(() => URL.revokeObjectURL(link.href), 10_000);
}
