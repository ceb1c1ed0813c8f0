/** The solver's contract as plain types; shared/schemas/solve.ts checks the same shapes at run time. */

/** One length wanted `quantity` times. */
export type SolvePiece = {
  id: string;
  mark?: string | undefined;
  lengthNm: number;
  quantity: number;
};

/** One length that may be bought (`supply` null) or lies on the rack (`supply` 1). Cost in minor units a bar. */
export type SolveStock = {
  id: string;
  source: 'new' | 'drop';
  lengthNm: number;
  costMinor: number;
  supply: number | null;
};

/** Allowances of the station. A crop includes its own cut; a shear has no kerf. */
export type SolveCutting = {
  kerfNm: number;
  headCropNm: number;
  tailCropNm: number;
  holdDownNm: number;
};

/** Leftovers from `keepFromNm` up are drops and earn the credit; shorter ones are scrap. */
export type SolveDropRule = {
  keepFromNm: number;
  creditMinorPerM: number;
  scrapMinorPerM: number;
};

/** One section and grade. */
export type SolveGroup = {
  id: string;
  kind: 'linear';
  pieces: SolvePiece[];
  stock: SolveStock[];
  cutting: SolveCutting;
  drops: SolveDropRule;
};

export type SolveRequest = {
  version: 1;
  seed: number;
  timeLimitMs: number;
  groups: SolveGroup[];
};

export type SolveCut = { pieceId: string; startNm: number; lengthNm: number };

/** The way one bar is cut, `repeat` times. */
export type SolveLayout = {
  stockId: string;
  repeat: number;
  cuts: SolveCut[];
  leftoverNm: number;
  keeps: boolean;
};

export type SolveUnplaced = { pieceId: string; quantity: number; reason: string };

export type SolveOutcome = 'proven' | 'bounded' | 'unplaceable';

export type SolveGroupResult = {
  id: string;
  outcome: SolveOutcome;
  /** Minor units before rounding, over the placed pieces. */
  netCostMinor: number;
  /** No plan of the placed pieces costs less; minor units before rounding. */
  boundMinor: number;
  /** (net − bound) / net. */
  gap: number;
  layouts: SolveLayout[];
  unplaced: SolveUnplaced[];
  counts: { bars: number; newBars: number; dropsUsed: number; layouts: number };
  work: { columns: number; lpRuns: number; dives: number; enumerated: number; elapsedMs: number };
};

export type SolveResult = { version: 1; groups: SolveGroupResult[] };
