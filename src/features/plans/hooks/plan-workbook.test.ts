import exceljs from 'exceljs';
import { describe, expect, it } from 'vitest';
import { fillPlanWorkbook } from '#src/features/plans/hooks/plan-workbook.ts';
import type { PlanView } from '#shared/schemas/plans.ts';

const group: PlanView['groups'][number] = {
  id: 'FB 1/2x6|A36',
  section: 'FB 1/2x6',
  stockKey: 'FB 1/2x6',
  family: 'flat',
  grade: '=A36',
  mgPerM: 15_186_000,
  pieces: [
    {
      id: '1',
      partLineId: 1,
      mark: '=HYPERLINK("x")',
      jobNumber: '+2407',
      partListName: '@list',
      revision: 'A',
      row: 2,
      lengthNm: 914_400_000,
      quantity: 6,
      pieceMassMg: 13_886_000,
    },
  ],
  stock: [
    {
      stockId: 'offer:1',
      source: 'new',
      lengthNm: 6_096_000_000,
      costMinor: 16_115,
      supplierName: '-1+2',
      drop: null,
    },
  ],
  request: {
    id: 'FB 1/2x6|A36',
    kind: 'linear',
    pieces: [{ id: '1', lengthNm: 914_400_000, quantity: 6 }],
    stock: [{ id: 'offer:1', source: 'new', lengthNm: 6_096_000_000, costMinor: 16_115, supply: null }],
    cutting: { kerfNm: 0, headCropNm: 0, tailCropNm: 0, holdDownNm: 0 },
    drops: { keepFromNm: 609_600_000, creditMinorPerM: 0, scrapMinorPerM: 0 },
  },
  result: {
    id: 'FB 1/2x6|A36',
    outcome: 'proven',
    netCostMinor: 16_115,
    boundMinor: 16_115,
    gap: 0,
    layouts: [
      {
        stockId: 'offer:1',
        repeat: 1,
        cuts: [0, 1, 2, 3, 4, 5].map((i) => ({
          pieceId: '1',
          startNm: i * 914_400_000,
          lengthNm: 914_400_000,
        })),
        leftoverNm: 609_600_000,
        keeps: true,
      },
    ],
    unplaced: [],
    counts: { bars: 1, newBars: 1, dropsUsed: 0, layouts: 1 },
    work: { columns: 1, lpRuns: 1, dives: 0, enumerated: 0, elapsedMs: 1 },
  },
};
const view: PlanView = {
  plan: {
    id: 1,
    number: 101,
    name: 'Test',
    state: 'issued',
    jobs: [],
    stationId: 1,
    stationName: 'Shear',
    groups: 1,
    pieces: 6,
    bars: 1,
    barsCut: 0,
    newBars: 1,
    dropsUsed: 0,
    netMinor: 16_115,
    boundMinor: 16_115,
    createdBy: '',
    createdAt: '2026-01-01T00:00:00.000Z',
    issuedAt: null,
    version: 1,
    can: {},
  },
  groups: [group],
  bars: [
    {
      id: 1,
      groupId: group.id,
      layout: 0,
      number: 1,
      state: 'waiting',
      heat: null,
      makesTag: 7,
      madeDrop: null,
      cutBy: null,
      cutAt: null,
      version: 1,
    },
  ],
};

async function writtenAndRead() {
  const book = new exceljs.Workbook();
  fillPlanWorkbook(book, view, { units: 'imperial', currency: 'USD', name: 'Shop' });
  const read = new exceljs.Workbook();
  await read.xlsx.load(await book.xlsx.writeBuffer());
  return read;
}

describe('workbook of a plan', () => {
  it('has typed numbers and units in the heads', async () => {
    const book = await writtenAndRead();
    expect(book.worksheets.map(({ name }) => name)).toEqual(['Bars', 'Cuts', 'Bill', 'Drops']);
    const cuts = book.getWorksheet('Cuts');
    expect(cuts?.getCell('I1').value).toBe('Stop (in)');
    expect(cuts?.getCell('I2').value).toBe(36);
    expect(cuts?.getCell('J7').value).toBe(216);
    const bill = book.getWorksheet('Bill');
    expect(bill?.getCell('H1').value).toBe('Cost (USD)');
    expect(bill?.getCell('H2').value).toBe(161.15);
    expect(book.getWorksheet('Drops')?.getCell('B2').value).toBe('D-0007');
  });
  it('keeps text that begins like a formula as text', async () => {
    const book = await writtenAndRead();
    const texts: unknown[] = [];
    book.eachSheet((sheet) =>
      sheet.eachRow((row) =>
        row.eachCell((cell) => texts.push(cell.type === exceljs.ValueType.Formula ? 'FORMULA' : cell.value)),
      ),
    );
    expect(texts).not.toContain('FORMULA');
    expect(texts.filter((text) => typeof text === 'string' && /^[=+\-@]/.test(text))).toEqual([]);
    expect(texts).toContain(`'=HYPERLINK("x")`);
  });
});
