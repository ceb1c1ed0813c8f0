/** The demo shop: invented from end to end. It goes through the same services as everybody, so what it holds is real. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { write } from '#server/database.ts';
import { BarRow, PlanLayoutRow, PlanRow, PlanStockRow, type Person } from '#server/models/index.ts';
import type { Actor } from '#server/middleware/route.ts';
import { passwordHash } from '#server/services/auth/passwords.ts';
import { cutBar } from '#server/services/cut-bar.ts';
import { DEMO_PASSWORD, DEMO_PEOPLE } from '#server/services/demo-people.ts';
import { logDrop } from '#server/services/drops.ts';
import { issuePlan } from '#server/services/issue-plan.ts';
import { makeJob } from '#server/services/jobs.ts';
import { listLines, storePartList } from '#server/services/part-lists.ts';
import { makePerson } from '#server/services/people.ts';
import { describePlanning } from '#server/services/planning.ts';
import { savePlan } from '#server/services/save-plan.ts';
import { changeShop, findShop, setUpShop } from '#server/services/shop.ts';
import { makeOffer, makeStation, makeSupplier } from '#server/services/yard.ts';
import { defaultEdits, planRequest } from '#shared/domain/plan-request.ts';
import { sectionByName } from '#shared/domain/section/section-by-name.ts';
import { MG_PER_LB, NM_PER_FOOT, NM_PER_INCH, NM_PER_M } from '#shared/domain/units.ts';
import type { Role } from '#shared/permissions.ts';
import { solveRequest } from '#workers/solver/node.ts';

/** The commands of package.json run in the repository's folder. */
const demoFile = (name: string) => readFileSync(join(process.cwd(), 'fixtures/demo', name));

const inches = (n: number) => Math.round(n * NM_PER_INCH);

/** Section, grade, cents a pound, lengths in feet. */
const OFFERS: readonly (readonly [section: string, grade: string, centsPerLb: number, feet: readonly number[]])[] = [
  ['L2x2x1/4', 'A36', 82, [20, 40]],
  ['L3x3x1/4', 'A36', 78, [20, 40]],
  ['L4x4x3/8', 'A36', 76, [20, 40]],
  ['FB 3/8x4', 'A36', 80, [20]],
  ['FB 1/2x6', 'A36', 79, [20]],
  ['HSS2x2x3/16', 'A500C', 104, [20, 24]],
  ['HSS4x2x1/4', 'A500C', 98, [20, 24, 40]],
  ['C6x8.2', 'A36', 74, [20, 40]],
  ['RB 3/4', 'A36', 84, [20]],
  ['SQ 1/2', 'A36', 88, [20]],
  ['PIPE 2 STD', 'A53B', 110, [21]],
  ['W8x18', 'A992', 72, [40, 60]],
];

/** Longer bars are a little cheaper by weight, and every second supplier a little dearer (invented). */
function priceMinor(section: string, centsPerLb: number, feet: number, factor: number): number {
  const found = sectionByName(section);
  const mgPerM = found?.mass.per === 'length' ? found.mass.mgPerM : 0;
  const lb = (mgPerM * ((feet * NM_PER_FOOT) / NM_PER_M)) / MG_PER_LB;
  return Math.round(lb * centsPerLb * factor * (feet >= 40 ? 0.985 : 1));
}

/** Section, grade, length in inches, slot, heat. */
const RACK: readonly (readonly [section: string, grade: string, inches: number, slot: string, heat: string | null])[] = [
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
  ['HSS2x2x3/16', 'A500C', 172, 'C-1-2', 'T88412'],
  ['HSS2x2x3/16', 'A500C', 121.5, 'C-1-2', 'T88412'],
  ['HSS2x2x3/16', 'A500C', 80, 'C-1-1', null],
  ['HSS4x2x1/4', 'A500C', 133, 'C-2-1', 'T90155'],
  ['HSS4x2x1/4', 'A500C', 69.75, 'C-2-1', 'T90155'],
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

const actorOf = ({ id, name, email, role }: Person): Actor => ({ id, name, email, role });

async function plan(name: string, jobId: number, stationId: number, actor: Actor, only?: (key: string) => boolean): Promise<number> {
  const lines = await listLines({ jobIds: [jobId], open: true });
  const view = await describePlanning(lines.map(({ line }) => line.id));
  const wanted = only ? { ...view, groups: view.groups.filter(({ id }) => only(id)) } : view;
  const request = planRequest(wanted, defaultEdits(wanted), { seed: 1, timeLimitMs: 4000 });
  return savePlan({ name, stationId, request, result: await solveRequest(request) }, actor);
}

/** Fills an empty database. Takes a few seconds: its plans are really solved. */
export async function loadDemoShop(): Promise<void> {
  const person = (role: Role) => DEMO_PEOPLE.find((entry) => entry.role === role) ?? DEMO_PEOPLE[0];
  const boss = person('manager');
  const manager = await setUpShop(
    { shopName: 'Tallowfield Steelwork', units: 'imperial', currency: 'USD', paper: 'letter', name: boss?.name ?? '', email: boss?.email ?? '', password: DEMO_PASSWORD },
    { demo: true },
  );
  const hash = await passwordHash(DEMO_PASSWORD);
  const people = new Map<Role, Actor>([['manager', actorOf(manager)]]);
  await write(async () => {
    for (const { role, name, email } of DEMO_PEOPLE) if (role !== 'manager') people.set(role, actorOf(await makePerson({ name, email, role, hash })));
  });
  const as = (role: Role): Actor => people.get(role) ?? actorOf(manager);

  const shop = await findShop();
  if (shop)
    await changeShop(
      { name: shop.name, units: shop.units, inchDenominator: 16, currency: shop.currency, paper: shop.paper, handlingMassMg: shop.handlingMassMg, scrapMinorPerTonne: 17_600, version: shop.version },
      as('manager'),
    );

  const shear = await makeStation(
    { name: 'Shear 2', method: 'shear', kerfNm: 0, headCropNm: inches(0.25), tailCropNm: 0, holdDownNm: inches(4), longestStopNm: inches(120), families: ['angle', 'flat', 'round', 'square'], note: 'Angle and flat shear with rod shear. Square one end first.' },
    as('manager'),
  );
  const saw = await makeStation(
    { name: 'Cold saw', method: 'saw', kerfNm: inches(0.125), headCropNm: inches(0.5), tailCropNm: 0, holdDownNm: inches(3), longestStopNm: inches(240), families: ['channel', 'beam', 'tube', 'round-tube', 'gauge-tube', 'pipe'], note: 'Blade 315 mm, kerf measured at the last change.' },
    as('manager'),
  );

  const suppliers = [];
  for (const name of ['Marlgate Metals', 'Quillon Bar & Tube', 'Westmoor Steel Yard'])
    suppliers.push(await makeSupplier({ name, email: `sales@${name.toLowerCase().replace(/[^a-z]/g, '')}.example`, note: '' }, as('purchaser')));
  for (const [i, [section, grade, centsPerLb, feet]] of OFFERS.entries())
    for (const [j, length] of feet.entries()) {
      const supplier = suppliers[(i + j) % suppliers.length];
      if (supplier)
        await makeOffer(
          { supplierId: supplier.id, section, grade, lengthNm: length * NM_PER_FOOT, priceMinor: priceMinor(section, centsPerLb, length, 1 + 0.01 * ((i + j) % 3)) },
          as('purchaser'),
        );
    }

  for (const [section, grade, length, slot, heat] of RACK)
    await logDrop({ section, grade, lengthNm: inches(length), widthNm: null, slot, heat, note: '' }, as('yard'));

  const job = async (number: string, name: string, customer: string, fileName: string) => {
    const made = await makeJob({ number, name, customer }, as('detailer'));
    await storePartList(made.job.id, { fileName, bytes: demoFile(fileName), details: { name: 'Main list', revision: 'A', choices: {} } }, as('detailer'));
    return made.job.id;
  };
  const stairs = await job('2407', 'Mezzanine stairs', 'Harrow & Pell Foods', 'mezzanine-stairs.csv');
  const rails = await job('2411', 'Loading dock handrail', 'Harrow & Pell Foods', 'handrail.csv');
  await job('2418', 'Conveyor supports', 'Brackwater Sorting', 'conveyor-supports.csv');

  const issued = await plan('Mezzanine stairs, angle and flat', stairs, shear.id, as('purchaser'), (key) => /^(L|FB|RB|SQ)/.test(key));
  await plan('Dock handrail, pipe', rails, saw.id, as('detailer'), (key) => key.startsWith('PIPE'));
  const draft = await PlanRow.findByPk(issued);
  await issuePlan(issued, { stationId: shear.id, version: draft?.version ?? 1 }, as('purchaser'));
  const bars = await BarRow.findAll({ where: { planId: issued }, order: [['number', 'ASC']], limit: 3 });
  for (const bar of bars) {
    const heat = (await fromDrop(bar)) ? {} : { heat: '52A377' };
    await cutBar(bar.id, { ...heat, ...(bar.makesTag === null ? {} : { slot: 'B-3-3' }), version: bar.version }, as('operator'));
  }
}

async function fromDrop(bar: BarRow): Promise<boolean> {
  const layout = await PlanLayoutRow.findByPk(bar.layoutId);
  const stock = layout ? await PlanStockRow.findByPk(layout.stockId) : null;
  return stock?.source === 'drop';
}
