/** Stations, suppliers, offers and rack of the demo shop. Names and figures are invented; sizes and grades are the trade's. */
import type { Actor } from '#server/policies/actor.ts';
import { changeDrop, logDrop } from '#server/services/change-drop.ts';
import { findDrop } from '#server/services/drops.ts';
import { makeOffer } from '#server/services/offers.ts';
import { makeStation, makeSupplier } from '#server/services/yard.ts';
import { sectionByName } from '#shared/domain/section/section-by-name.ts';
import { MG_PER_LB, NM_PER_FOOT, NM_PER_INCH, NM_PER_M } from '#shared/domain/units.ts';
import type { StationInput } from '#shared/schemas/yard.ts';

const inches = (n: number) => Math.round(n * NM_PER_INCH);

const STATIONS = {
  shear: {
    name: 'Shear 2',
    method: 'shear',
    kerfNm: 0,
    headCropNm: inches(0.25),
    tailCropNm: 0,
    holdDownNm: inches(4),
    longestStopNm: inches(120),
    families: ['angle', 'flat', 'round', 'square'],
    note: 'Angle and bar shear. Square one end first, hold-down on.',
  },
  saw: {
    name: 'Cold saw',
    method: 'saw',
    kerfNm: inches(0.125),
    headCropNm: inches(0.5),
    tailCropNm: 0,
    holdDownNm: inches(3),
    longestStopNm: inches(240),
    families: ['channel', 'beam', 'tube', 'round-tube', 'gauge-tube', 'pipe'],
    note: 'Blade 315 mm, kerf measured at the last change.',
  },
  plateShear: {
    name: 'Plate shear',
    method: 'shear',
    kerfNm: 0,
    headCropNm: inches(0.25),
    tailCropNm: 0,
    holdDownNm: inches(5),
    longestStopNm: inches(36),
    families: ['plate', 'floor-plate', 'sheet'],
    note: '10 ft, 1/4 in mild plate by the plate on the machine.',
  },
} as const satisfies Record<string, StationInput>;

/** Makes the stations; the ids of the two that cut bars. */
export async function makeDemoStations(manager: Actor): Promise<{ shear: number; saw: number }> {
  const make = async (station: (typeof STATIONS)[keyof typeof STATIONS]) =>
    (await makeStation({ ...station, families: [...station.families] }, manager)).id;
  const shear = await make(STATIONS.shear);
  const saw = await make(STATIONS.saw);
  await make(STATIONS.plateShear);
  return { shear, saw };
}

const SUPPLIERS = ['Marlgate Metals', 'Quillon Bar & Tube', 'Ostrel Steel Yard'] as const;

/** Section, grade, cents a pound, lengths in feet. */
const OFFERS: readonly (readonly [
  section: string,
  grade: string,
  centsPerLb: number,
  feet: readonly number[],
])[] = [
  ['L2x2x1/4', 'A36', 82, [20, 40]],
  ['L3x3x1/4', 'A36', 78, [20, 40]],
  ['L4x4x3/8', 'A36', 76, [20, 40]],
  ['FB 3/8x4', 'A36', 80, [20]],
  ['FB 1/2x6', 'A36', 79, [20]],
  ['HSS2x2x3/16', 'A500B', 104, [20, 24]],
  ['HSS4x2x1/4', 'A500B', 98, [20, 24, 40]],
  ['C6x8.2', 'A36', 74, [20, 40]],
  ['RB 3/4', 'A36', 84, [20]],
  ['SQ 1/2', 'A36', 88, [20]],
  ['PIPE 2 STD', 'A53B', 106, [21, 42]],
  ['W8x18', 'A992', 72, [40, 60]],
];

/** Long bars are a little cheaper by weight (invented). */
function priceMinor(section: string, centsPerLb: number, feet: number, factor: number): number {
  const found = sectionByName(section);
  if (found?.mass.per !== 'length') throw new Error(`${section} is no bar of the catalogue`);
  const lb = (found.mass.mgPerM * ((feet * NM_PER_FOOT) / NM_PER_M)) / MG_PER_LB;
  return Math.round(lb * centsPerLb * factor * (feet >= 40 ? 0.985 : 1));
}

/** Every bar from one supplier, the shortest of each section from a second one too, a little dearer. */
export async function makeDemoOffers(purchaser: Actor): Promise<void> {
  const ids: number[] = [];
  for (const name of SUPPLIERS) {
    const email = `sales@${name.toLowerCase().replace(/[^a-z]/g, '')}.example`;
    ids.push((await makeSupplier({ name, email, note: '' }, purchaser)).id);
  }
  for (const [i, [section, grade, centsPerLb, feet]] of OFFERS.entries())
    for (const [j, length] of feet.entries())
      for (const [k, factor] of (j === 0 ? [1, 1.03] : [1]).entries()) {
        const supplierId = ids[(i + j + k) % ids.length];
        if (supplierId !== undefined)
          await makeOffer(
            {
              supplierId,
              section,
              grade,
              lengthNm: length * NM_PER_FOOT,
              priceMinor: priceMinor(section, centsPerLb, length, factor),
            },
            purchaser,
          );
      }
}

type RackEntry = readonly [section: string, grade: string, inches: number, slot: string, heat: string | null];
const RACK: readonly RackEntry[] = [
  ['L3x3x1/4', 'A36', 137.25, 'B-3-2', '47K210'],
  ['L3x3x1/4', 'A36', 96.5, 'B-3-2', '47K210'],
  ['L3x3x1/4', 'A36', 62, 'B-3-1', null],
  ['L2x2x1/4', 'A36', 118.75, 'B-2-1', '51C083'],
  ['L2x2x1/4', 'A36', 74.5, 'B-2-1', null],
  ['L2x2x1/4', 'A36', 50, 'B-2-2', '51C083'],
  ['L4x4x3/8', 'A36', 144, 'B-4-1', '46D977'],
  ['L4x4x3/8', 'A36', 88.25, 'B-4-1', '46D977'],
  ['FB 3/8x4', 'A36', 95, 'A-1-4', null],
  ['FB 3/8x4', 'A36', 66.5, 'A-1-4', '60B114'],
  ['FB 3/8x4', 'A36', 41.25, 'A-1-3', '60B114'],
  ['FB 1/2x6', 'A36', 110, 'A-2-2', '60F320'],
  ['FB 1/2x6', 'A36', 58, 'A-2-2', null],
  ['HSS2x2x3/16', 'A500B', 172, 'C-1-2', 'T88412'],
  ['HSS2x2x3/16', 'A500B', 121.5, 'C-1-2', 'T88412'],
  ['HSS2x2x3/16', 'A500B', 80, 'C-1-1', null],
  ['HSS4x2x1/4', 'A500B', 133, 'C-2-1', 'T90155'],
  ['HSS4x2x1/4', 'A500B', 69.75, 'C-2-1', 'T90155'],
  ['C6x8.2', 'A36', 156, 'D-1-1', '44H602'],
  ['C6x8.2', 'A36', 104.5, 'D-1-1', null],
  ['RB 3/4', 'A36', 84, 'A-4-1', '38R551'],
  ['RB 3/4', 'A36', 55, 'A-4-1', null],
  ['SQ 1/2', 'A36', 92, 'A-4-2', '38S019'],
  ['PIPE 2 STD', 'A53B', 126, 'C-3-1', 'P20774'],
  ['PIPE 2 STD', 'A53B', 87.5, 'C-3-1', 'P20774'],
  ['PIPE 2 STD', 'A53B', 48, 'C-3-2', null],
  ['W8x18', 'A992', 214, 'D-3-1', 'W61908'],
  ['W8x18', 'A992', 139.5, 'D-3-1', 'W61908'],
];

async function setState(dropId: number, state: 'scrapped' | 'missing', reason: string, yard: Actor) {
  const { drop } = await findDrop(dropId);
  await changeDrop(dropId, { state, reason, version: drop.version }, yard);
}

/** Logs the rack as it lies, and what a stock-take found of it. */
export async function logDemoRack(yard: Actor): Promise<void> {
  const plain = { widthNm: null, note: '' };
  for (const [section, grade, length, slot, heat] of RACK)
    await logDrop({ ...plain, section, grade, lengthNm: inches(length), slot, heat }, yard);
  await logDrop(
    {
      section: 'PL1/4',
      grade: 'A36',
      lengthNm: inches(48),
      widthNm: inches(22),
      slot: 'E-1-1',
      heat: 'P31406',
      note: 'Rolling direction along the length, arrow painted on.',
    },
    yard,
  );
  const short = await logDrop(
    { ...plain, section: 'L2x2x1/4', grade: 'A36', lengthNm: inches(27), slot: 'B-2-2', heat: null },
    yard,
  );
  await setState(short, 'scrapped', 'bent at one end', yard);
  const lost = await logDrop(
    { ...plain, section: 'C6x8.2', grade: 'A36', lengthNm: inches(66), slot: 'D-1-2', heat: '44H602' },
    yard,
  );
  await setState(lost, 'missing', 'not there at the count of bay D', yard);
}
