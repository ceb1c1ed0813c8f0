import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import type { SolveGroup } from '#shared/domain/solve.ts';

export type Instance = {
  set: string;
  name: string;
  capacity: number;
  items: [number, number][];
  optimum: number;
};

const folder = join(import.meta.dirname, '../../fixtures/literature');

export const literatureSets = (): string[] =>
  readdirSync(folder)
    .filter((file) => file.endsWith('.jsonl'))
    .map((file) => file.replace('.jsonl', ''));

/** The instances of one published set; sources in fixtures/literature/README.md. */
export const readInstances = (set: string): Instance[] =>
  readFileSync(join(folder, `${set}.jsonl`), 'utf8')
    .split('\n')
    .filter((line) => line.trim() !== '')
    .map((line) => JSON.parse(line) as Instance);

/** An instance as a group: a millimetre a unit, one bar length at a price of 100 minor units, a shear without allowances. */
export const asGroup = ({
  name,
  capacity,
  items,
}: Pick<Instance, 'name' | 'capacity' | 'items'>): SolveGroup => ({
  id: name,
  kind: 'linear',
  pieces: items.map(([length, quantity], i) => ({ id: `p${i}`, lengthNm: length * 1_000_000, quantity })),
  stock: [{ id: 'bar', source: 'new', lengthNm: capacity * 1_000_000, costMinor: 100, supply: null }],
  cutting: { kerfNm: 0, headCropNm: 0, tailCropNm: 0, holdDownNm: 0 },
  drops: { keepFromNm: 1_000_000, creditMinorPerM: 0, scrapMinorPerM: 0 },
});
