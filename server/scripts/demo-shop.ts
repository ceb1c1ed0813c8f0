/** The demo shop: invented from end to end. It goes through the same services as everybody, so what it holds is real. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { write } from '#server/database.ts';
import type { Person } from '#server/models/index.ts';
import type { Actor } from '#server/policies/actor.ts';
import { expectFound } from '#server/policies/version.ts';
import { logDemoRack, makeDemoOffers, makeDemoStations } from '#server/scripts/demo-yard.ts';
import { passwordHash } from '#server/services/auth/passwords.ts';
import { cutBar } from '#server/services/cut-bar.ts';
import { DEMO_PASSWORD, DEMO_PEOPLE } from '#server/services/demo-people.ts';
import { issuePlan } from '#server/services/issue-plan.ts';
import { makeJob } from '#server/services/jobs.ts';
import { listLines } from '#server/services/part-lists.ts';
import { makePerson } from '#server/services/people.ts';
import { describePlanning } from '#server/services/planning.ts';
import { findPlanWhole } from '#server/services/read-plan.ts';
import { savePlan } from '#server/services/save-plan.ts';
import { changeShop, findShop, setUpShop } from '#server/services/shop.ts';
import { storePartList } from '#server/services/store-part-list.ts';
import { defaultEdits, planRequest } from '#shared/domain/plan-request.ts';
import type { Role } from '#shared/permissions.ts';
import type { Bar } from '#shared/schemas/plans.ts';
import { solveRequest } from '#workers/solver/node.ts';

/** The commands of package.json run in the repository's folder. */
const demoFile = (name: string) => readFileSync(join(process.cwd(), 'fixtures/demo', name));

/** What a dealer might pay for 1000 kg of clean shop scrap, in cents (invented): about 8 cents a pound. */
const SCRAP_MINOR_PER_TONNE = 17_600;

/** A trial should open soon; the groups are small, and what is not proven by then says so. */
const SOLVE_MS = 1500;

const actorOf = ({ id, name, email, role }: Person): Actor => ({ id, name, email, role });

/** Shop and people; who has which role. */
async function makeShop(): Promise<(role: Role) => Actor> {
  const boss = expectFound(
    DEMO_PEOPLE.find(({ role }) => role === 'manager'),
    'manager',
  );
  const manager = await setUpShop(
    {
      shopName: 'Tallowfield Steelwork',
      units: 'imperial',
      currency: 'USD',
      paper: 'letter',
      name: boss.name,
      email: boss.email,
      password: DEMO_PASSWORD,
    },
    { demo: true },
  );
  const hash = await passwordHash(DEMO_PASSWORD);
  const people = new Map<Role, Actor>([['manager', actorOf(manager)]]);
  await write(async () => {
    for (const { role, name, email } of DEMO_PEOPLE)
      if (role !== 'manager') people.set(role, actorOf(await makePerson({ name, email, role, hash })));
  });
  const { name, units, inchDenominator, currency, paper, handlingMassMg, version } = expectFound(
    await findShop(),
    'shop',
  );
  const settings = { name, units, inchDenominator, currency, paper, handlingMassMg, version };
  await changeShop({ ...settings, scrapMinorPerTonne: SCRAP_MINOR_PER_TONNE }, actorOf(manager));
  return (role) => people.get(role) ?? actorOf(manager);
}

type JobText = { number: string; name: string; customer: string; fileName: string };

async function makeJobWithList({ fileName, ...job }: JobText, detailer: Actor): Promise<number> {
  const made = await makeJob(job, detailer);
  const details = { name: 'Main list', revision: 'A', choices: {} };
  await storePartList(made.job.id, { fileName, bytes: demoFile(fileName), details }, detailer);
  return made.job.id;
}

type Wanted = { name: string; jobId: number; stationId: number; wants: (groupId: string) => boolean };

/** Plans the wanted groups of a job with everything the shop has, and saves the draft. */
async function draftPlan({ name, jobId, stationId, wants }: Wanted, planner: Actor): Promise<number> {
  const lines = await listLines({ jobIds: [jobId], open: true });
  const view = await describePlanning(lines.map(({ line }) => line.id));
  const wanted = { ...view, groups: view.groups.filter(({ id }) => wants(id)) };
  const request = planRequest(wanted, defaultEdits(wanted), { seed: 1, timeLimitMs: SOLVE_MS });
  return savePlan({ name, stationId, request, result: await solveRequest(request) }, planner);
}

/** Cuts two new bars, of which one shows no heat, and the first drop that was pulled. */
async function cutSomeBars(planId: number, operator: Actor): Promise<void> {
  const { groups, bars } = await findPlanWhole(planId);
  const isDrop = (bar: Bar) => {
    const group = groups.find(({ id }) => id === bar.groupId);
    const stockId = group?.result.layouts[bar.layout]?.stockId;
    return group?.stock.find((stock) => stock.stockId === stockId)?.source === 'drop';
  };
  const cut = async (bar: Bar, heat: { heat?: string | null }) => {
    const slot = bar.makesTag === null ? {} : { slot: 'B-3-3' };
    await cutBar(bar.id, { ...heat, ...slot, version: bar.version }, operator);
  };
  const [first, second] = bars.filter((bar) => !isDrop(bar));
  const pulled = bars.find(isDrop);
  if (first) await cut(first, { heat: '52A377' });
  if (second) await cut(second, { heat: null });
  if (pulled) await cut(pulled, {});
}

/** Fills an empty database. Takes a few seconds: its plans are really solved. */
export async function loadDemoShop(): Promise<void> {
  const as = await makeShop();
  // One transaction for many small writes: opening one for each takes longer than all of them.
  const station = await write(async () => {
    await makeDemoOffers(as('purchaser'));
    await logDemoRack(as('yard'));
    return makeDemoStations(as('manager'));
  });

  const foods = 'Harrow & Pell Foods';
  const stairs = await makeJobWithList(
    { number: '2407', name: 'Mezzanine stairs', customer: foods, fileName: 'mezzanine-stairs.csv' },
    as('detailer'),
  );
  const rails = await makeJobWithList(
    { number: '2411', name: 'Loading dock handrail', customer: foods, fileName: 'handrail.csv' },
    as('detailer'),
  );
  await makeJobWithList(
    {
      number: '2418',
      name: 'Conveyor supports',
      customer: 'Brackwater Sorting',
      fileName: 'conveyor-supports.csv',
    },
    as('detailer'),
  );

  const issued = await draftPlan(
    {
      name: 'Mezzanine stairs, angle and flat',
      jobId: stairs,
      stationId: station.shear,
      wants: (groupId) => /^(L|FB|RB|SQ)/.test(groupId),
    },
    as('purchaser'),
  );
  await draftPlan(
    {
      name: 'Dock handrail, pipe',
      jobId: rails,
      stationId: station.saw,
      wants: (groupId) => groupId.startsWith('PIPE'),
    },
    as('detailer'),
  );
  await issuePlan(issued, { stationId: station.shear, version: 1 }, as('purchaser'));
  await cutSomeBars(issued, as('operator'));
}
