type Search = Readonly<Record<string, string | number | null | undefined>>;

/** Adds what is set as a query string; empty and missing values are left out. */
export function withSearch(path: string, search: Search): string {
  const query = new URLSearchParams();
  for (const [key, value] of Object.entries(search))
    if (value !== null && value !== undefined && value !== '') query.set(key, String(value));
  const text = query.toString();
  return text ? `${path}?${text}` : path;
}

/** Every address of the client, in one place. */
export const paths = {
  signIn: (back?: string) => withSearch('/sign-in', { back }),
  setUp: () => '/set-up',
  join: (token: string) => `/join/${token}`,
  jobs: () => '/jobs',
  job: (jobId: number) => `/jobs/${jobId}`,
  upload: (jobId: number) => `/jobs/${jobId}/upload`,
  partList: (partListId: number) => `/part-lists/${partListId}`,
  plans: () => '/plans',
  newPlan: (from: { partList?: number; job?: number; lines?: readonly number[] } = {}) =>
    withSearch('/plans/new', { partList: from.partList, job: from.job, lines: from.lines?.join(',') }),
  plan: (planId: number) => `/plans/${planId}`,
  planPrint: (planId: number) => `/plans/${planId}/print`,
  buying: () => '/buying',
  suppliers: () => '/buying/suppliers',
  bench: () => '/bench',
  benchPlan: (planId: number) => `/bench/${planId}`,
  rack: () => '/rack',
  logDrop: () => '/rack/log',
  drop: (dropId: number) => `/rack/${dropId}`,
  shop: () => '/shop',
  people: () => '/shop/people',
  stations: () => '/shop/stations',
  dropRules: () => '/shop/drop-rules',
  mail: () => '/shop/mail',
  audit: () => '/shop/audit',
};
