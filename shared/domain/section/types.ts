import type { Nm } from '#shared/domain/units.ts';

/** The families of the trade handbook. `tube` is square and rectangular, `round-tube` is HSS round and CHS. */
export const FAMILIES = [
  'angle',
  'flat',
  'round',
  'square',
  'channel',
  'beam',
  'tube',
  'round-tube',
  'pipe',
  'gauge-tube',
  'plate',
  'floor-plate',
  'sheet',
] as const;
export type Family = (typeof FAMILIES)[number];

export type System = 'US' | 'EN';

/** Families cut as sheets, not as bars: they carry a width beside the length. */
export const PLATE_FAMILIES: readonly Family[] = ['plate', 'floor-plate', 'sheet'];

/**
 * True size of the cross-section in nanometres, as far as the designation or the handbook's
 * formula gives it. Which fields are set depends on the family:
 * angle legA legB thickness · flat width thickness · round diameter · square width ·
 * channel/beam depth (nominal) · tube width height wall · round-tube, pipe diameter wall ·
 * gauge-tube width height wall (or diameter wall) · plate families thickness.
 */
export type SectionDimensions = {
  readonly legA?: Nm;
  readonly legB?: Nm;
  readonly thickness?: Nm;
  readonly width?: Nm;
  readonly height?: Nm;
  readonly depth?: Nm;
  readonly flange?: Nm;
  readonly wall?: Nm;
  readonly diameter?: Nm;
};

export type Section = {
  /** Canonical spelling, e.g. `L4x4x3/8`, `FB 1/2x6`, `PIPE 2 STD`, `SHS 40x40x3`. Lower-case x. */
  readonly name: string;
  /**
   * What stock must match: equal to `name` for bars; for plate families the thickness alone
   * (`PL1/4`), because width and length belong to the piece.
   */
  readonly stockKey: string;
  readonly family: Family;
  readonly system: System;
  readonly dimensions: SectionDimensions;
  /** Bars: milligrams per metre. Plate families: milligrams per square metre. */
  readonly mass:
    | { readonly per: 'length'; readonly mgPerM: number; readonly basis: MassBasis }
    | { readonly per: 'area'; readonly mgPerM2: number; readonly basis: MassBasis };
};

/** Where a mass comes from: a published table, the number in the name itself, or geometry. */
export type MassBasis = 'table' | 'name' | 'formula';

/** What reading one section cell gave. `asked` never carries a guess: the person picks or retypes. */
export type SectionReading =
  | {
      readonly outcome: 'read';
      readonly section: Section;
      /** Plate designations may carry their own width and length. */
      readonly widthNm?: Nm;
      readonly lengthNm?: Nm;
      readonly notes: readonly string[];
    }
  | {
      readonly outcome: 'asked';
      /** kebab-case, e.g. `section-no-family`, `section-incomplete`, `section-date`, `section-unknown`. */
      readonly code: string;
      readonly message: string;
      /** Canonical spellings the text could mean, best first; empty when nothing is near. */
      readonly choices: readonly string[];
    };
