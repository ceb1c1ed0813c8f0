/** The everyday acts of a shop through the API, for tests that need one before they can look at the next. */
import type { z } from 'zod';
import { openTestShop, type TestShop } from '#tests/support/test-shop.ts';
import { defaultEdits, planRequest } from '#shared/domain/plan-request.ts';
import type { SolveRequest, SolveResult } from '#shared/domain/solve.ts';
import { NM_PER_FOOT, NM_PER_INCH } from '#shared/domain/units.ts';
import type { Role } from '#shared/permissions.ts';
import { Job, PartListView } from '#shared/schemas/jobs.ts';
import { PlanningView, PlanView } from '#shared/schemas/plans.ts';
import { DropView } from '#shared/schemas/rack.ts';
import { Offer, Station, Supplier } from '#shared/schemas/yard.ts';
import { solveRequest } from '#workers/solver/node.ts';

export const inches = (n: number): number => Math.round(n * NM_PER_INCH);
export const feet = (n: number): number => n * NM_PER_FOOT;

type Answer = { status: number; text: string; body: unknown };

/** The answer by its schema, or the status and the words that came instead. */
export function read<T>(answer: Answer, status: number, schema: z.ZodType<T>): T {
  if (answer.status !== status) throw new Error(`${answer.status} instead of ${status}: ${answer.text}`);
  return schema.parse(answer.body);
}

export async function post<T>(
  shop: TestShop,
  role: Role,
  path: string,
  body: object,
  schema: z.ZodType<T>,
  status = 201,
): Promise<T> {
  return read(await (await shop.as(role)).post(`/api${path}`).send(body), status, schema);
}

export const SHEAR = {
  name: 'Bar shear',
  method: 'shear',
  kerfNm: 0,
  headCropNm: inches(0.25),
  tailCropNm: 0,
  holdDownNm: inches(4),
  longestStopNm: inches(120),
  families: ['angle', 'flat', 'round', 'square'],
  note: '',
} as const;

export const makeStation = (shop: TestShop, station: object = SHEAR) =>
  post(shop, 'manager', '/stations', station, Station);
export const makeSupplier = (shop: TestShop, name: string) =>
  post(shop, 'purchaser', '/suppliers', { name }, Supplier);

export type OfferText = {
  supplierId: number;
  section: string;
  grade: string;
  lengthFt: number;
  priceMinor: number;
};
export const makeOffer = (shop: TestShop, { lengthFt, ...offer }: OfferText) =>
  post(shop, 'purchaser', '/offers', { ...offer, lengthNm: feet(lengthFt) }, Offer);

export type DropText = {
  section: string;
  grade: string;
  lengthIn: number;
  heat?: string | null;
  slot?: string;
};
export const logDrop = (
  shop: TestShop,
  { section, grade, lengthIn, heat = null, slot = 'A-1-1' }: DropText,
) => post(shop, 'yard', '/drops', { section, grade, lengthNm: inches(lengthIn), slot, heat }, DropView);

export const makeJob = (shop: TestShop, number: string) =>
  post(shop, 'detailer', '/jobs', { number, name: `Job ${number}`, customer: '' }, Job);

type Upload = { fileName?: string; name?: string; revision?: string; choices?: object };

export async function upload(shop: TestShop, jobId: number, bytes: Buffer | string, options: Upload = {}) {
  const { fileName = 'list.csv', name = 'Main list', revision = '', choices = {} } = options;
  return (await shop.as('detailer'))
    .post(`/api/jobs/${jobId}/part-lists`)
    .field('details', JSON.stringify({ name, revision, choices }))
    .attach('file', Buffer.from(bytes), fileName);
}

/** A job with one list of `mark,quantity,section,grade,length` rows. */
export async function makeList(shop: TestShop, number: string, rows: readonly string[]) {
  const job = await makeJob(shop, number);
  const csv = ['Mark,Qty,Section,Grade,Length', ...rows].join('\n');
  const view = read(await upload(shop, job.id, csv), 201, PartListView);
  return { job, ...view, lineIds: view.lines.map(({ id }) => id) };
}

export type Draft = { view: PlanningView; request: SolveRequest; result: SolveResult };

/** Defaults of the shop, really solved; `change` may touch the request first. */
export async function solveLines(
  shop: TestShop,
  partLineIds: readonly number[],
  change: (request: SolveRequest) => SolveRequest = (request) => request,
): Promise<Draft> {
  const view = await post(shop, 'detailer', '/planning', { partLineIds }, PlanningView, 200);
  const request = change(planRequest(view, defaultEdits(view), { seed: 1, timeLimitMs: 2000 }));
  return { view, request, result: await solveRequest(request) };
}

export async function saveDraft(
  shop: TestShop,
  { request, result }: Pick<Draft, 'request' | 'result'>,
  stationId: number | null = null,
) {
  return post(shop, 'detailer', '/plans', { name: 'A plan', stationId, request, result }, PlanView);
}

export async function sendIssue(shop: TestShop, { plan }: PlanView, stationId: number) {
  const agent = await shop.as('purchaser');
  return agent.post(`/api/plans/${plan.id}/issue`).send({ stationId, version: plan.version });
}

export async function findPlan(shop: TestShop, planId: number): Promise<PlanView> {
  return read(await (await shop.as('operator')).get(`/api/plans/${planId}`), 200, PlanView);
}

export async function findDrop(shop: TestShop, dropId: number): Promise<DropView> {
  return read(await (await shop.as('yard')).get(`/api/drops/${dropId}`), 200, DropView);
}

export const firstOf = <T>(list: readonly T[]): T => {
  const [first] = list;
  if (first === undefined) throw new Error('the list is empty');
  return first;
};

export const ANGLE = { section: 'L3x3x1/4', grade: 'A36' } as const;

/** A shop with a shear, one offer of 20 ft angle at 98.00 and the drops that are asked for. */
export async function openAngleShop(dropsIn: readonly number[] = []) {
  const shop = await openTestShop();
  const station = await makeStation(shop);
  const supplier = await makeSupplier(shop, 'Marlgate');
  const offer = await makeOffer(shop, { ...ANGLE, supplierId: supplier.id, lengthFt: 20, priceMinor: 9800 });
  const drops = [];
  for (const lengthIn of dropsIn)
    drops.push((await logDrop(shop, { ...ANGLE, lengthIn, heat: '47K210' })).drop);
  return { shop, stationId: station.id, supplierId: supplier.id, offer, drops };
}
