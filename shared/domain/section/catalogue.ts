/** Names the shop knows by heart: for type-ahead and for "did you mean". */
import { readSize, valueOf } from '#shared/domain/section/size.ts';
import { EN_ANGLE_KG_PER_M } from '#shared/domain/section/tables/en-angles.ts';
import {
  HEA_KG_PER_M,
  HEB_KG_PER_M,
  IPE_KG_PER_M,
  PFC_KG_PER_M,
  UPN_KG_PER_M,
} from '#shared/domain/section/tables/en-beams.ts';
import { US_ANGLE_LB_PER_FT } from '#shared/domain/section/tables/us-angles.ts';
import { US_C } from '#shared/domain/section/tables/us-c.ts';
import { US_MC } from '#shared/domain/section/tables/us-mc.ts';
import { US_PIPE } from '#shared/domain/section/tables/us-pipe.ts';
import { US_W } from '#shared/domain/section/tables/us-w.ts';

const named = (letter: string, table: Readonly<Record<string, readonly string[]>>) =>
  Object.entries(table).flatMap(([depth, weights]) => weights.map((weight) => `${letter}${depth}x${weight}`));
const sized = (letter: string, table: Readonly<Record<string, number>>) =>
  Object.keys(table).map((size) => `${letter} ${size}`);

const FLAT_THICKNESSES = ['1/8', '3/16', '1/4', '5/16', '3/8', '1/2', '5/8', '3/4', '1'];
const FLAT_WIDTHS = ['1', '1-1/4', '1-1/2', '2', '2-1/2', '3', '4', '5', '6', '8'];
const ROUNDS = ['1/4', '5/16', '3/8', '1/2', '5/8', '3/4', '7/8', '1', '1-1/4', '1-1/2', '2'];
const SQUARES = ['1/4', '3/8', '1/2', '5/8', '3/4', '1', '1-1/4', '1-1/2', '2'];
const TUBE_SIDES = [
  '1-1/2x1-1/2',
  '2x1',
  '2x2',
  '2-1/2x2-1/2',
  '3x1-1/2',
  '3x2',
  '3x3',
  '4x2',
  '4x3',
  '4x4',
  '5x3',
  '5x5',
  '6x2',
  '6x3',
  '6x4',
  '6x6',
  '8x4',
  '8x6',
  '8x8',
];
const TUBE_WALLS = ['1/8', '3/16', '1/4', '5/16', '3/8', '1/2'];
/** A wall of a quarter of the smaller side is the thickest that is rolled. */
const wallsOf = (sides: string) => {
  const smaller = inches(sides.split('x').at(-1) ?? '');
  return TUBE_WALLS.filter((wall) => inches(wall) <= smaller / 4);
};
const inches = (text: string) => {
  const size = readSize(text);
  return size ? valueOf(size) : 0;
};
const EN_FLATS = [
  '20x5',
  '25x5',
  '30x5',
  '40x5',
  '40x8',
  '50x5',
  '50x8',
  '50x10',
  '60x8',
  '60x10',
  '80x8',
  '80x10',
  '100x10',
  '150x12',
];
const EN_BARS = ['10', '12', '14', '16', '20', '25', '30', '40'];
const EN_SHS = [
  '25x25x2',
  '30x30x3',
  '40x40x3',
  '40x40x4',
  '50x50x3',
  '50x50x4',
  '50x50x5',
  '60x60x4',
  '80x80x4',
  '100x100x5',
];
const EN_RHS = ['40x20x2', '50x30x3', '60x40x3', '60x40x4', '80x40x3', '100x50x4'];

let names: readonly string[] | null = null;

/** Canonical bar spellings, grouped by family. */
export function catalogueNames(): readonly string[] {
  names ??= [
    ...Object.keys(US_ANGLE_LB_PER_FT),
    ...FLAT_THICKNESSES.flatMap((t) => FLAT_WIDTHS.filter((w) => w !== t).map((w) => `FB ${t}x${w}`)),
    ...ROUNDS.map((d) => `RB ${d}`),
    ...SQUARES.map((s) => `SQ ${s}`),
    ...named('C', US_C),
    ...named('MC', US_MC),
    ...named('W', US_W),
    ...TUBE_SIDES.flatMap((sides) => wallsOf(sides).map((wall) => `HSS${sides}x${wall}`)),
    ...Object.entries(US_PIPE).flatMap(([nps, entry]) =>
      Object.keys(entry)
        .filter((key) => key !== 'od')
        .map((key) => `PIPE ${nps} ${key}`),
    ),
    ...sized('L', EN_ANGLE_KG_PER_M),
    ...EN_FLATS.map((size) => `FLT ${size}`),
    ...EN_BARS.flatMap((size) => [`RND ${size}`, `SQ ${size}`]),
    ...sized('UPN', UPN_KG_PER_M),
    ...sized('PFC', PFC_KG_PER_M),
    ...sized('IPE', IPE_KG_PER_M),
    ...sized('HEA', HEA_KG_PER_M),
    ...sized('HEB', HEB_KG_PER_M),
    ...EN_SHS.map((size) => `SHS ${size}`),
    ...EN_RHS.map((size) => `RHS ${size}`),
  ];
  return names;
}

const letters = (text: string) => text.toUpperCase().replace(/[^A-Z0-9/.]/g, '');

function pairsOf(text: string): Set<string> {
  const plain = ` ${letters(text)} `;
  return new Set(Array.from({ length: plain.length - 1 }, (_, i) => plain.slice(i, i + 2)));
}

let cataloguePairs: readonly { name: string; have: ReadonlySet<string> }[] | null = null;

/** Made once: a list whose columns are mapped wrongly asks about every one of its rows. */
function pairsOfCatalogue() {
  cataloguePairs ??= catalogueNames().map((name) => ({ name, have: pairsOf(name) }));
  return cataloguePairs;
}

/** Up to five names that share most letter pairs with the text (Dice's coefficient over one half). */
export function nearestNames(text: string): string[] {
  const wanted = pairsOf(text);
  return pairsOfCatalogue()
    .map(({ name, have }) => {
      let shared = 0;
      for (const pair of wanted) if (have.has(pair)) shared += 1;
      return { name, score: (2 * shared) / (have.size + wanted.size) };
    })
    .filter(({ score }) => score > 0.5)
    .sort((a, b) => b.score - a.score)
    .slice(0, 5)
    .map(({ name }) => name);
}
