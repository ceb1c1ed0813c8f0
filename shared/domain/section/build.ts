/** Makes sections from true dimensions: canonical name, stock key, mass. One function a family. */
import { asNm, type Nm } from '#shared/domain/units.ts';
import type { MassBasis, Section, System } from '#shared/domain/section/types.ts';
import { inchText, mmText } from '#shared/domain/section/size.ts';
import {
  angleArea,
  areaToMgPerM,
  boxArea,
  kgPerMToMgPerM,
  lbPerFt2ToMgPerM2,
  lbPerFtToMgPerM,
  mm,
  roundArea,
  roundTubeArea,
  thicknessToMgPerM2,
} from '#shared/domain/section/mass-formulas.ts';
import { EN_ANGLE_KG_PER_M } from '#shared/domain/section/tables/en-angles.ts';
import { US_ANGLE_LB_PER_FT } from '#shared/domain/section/tables/us-angles.ts';
import { FLOOR_PLATE_LB_PER_FT2, SHEET_GAUGE } from '#shared/domain/section/tables/us-plate.ts';
import { US_PIPE } from '#shared/domain/section/tables/us-pipe.ts';

type Bar = Omit<Section, 'stockKey' | 'mass'> & { readonly mgPerM: number; readonly basis: MassBasis };

/** A bar's section: stock must match its whole name. */
export function bar({ mgPerM, basis, ...rest }: Bar): Section {
  return { ...rest, stockKey: rest.name, mass: { per: 'length', mgPerM, basis } };
}

const numberText = (system: System) => (system === 'US' ? inchText : mmText);
const join = (system: System, ...sizes: Nm[]) => sizes.map(numberText(system)).join('x');

export function angle(system: System, first: Nm, second: Nm, thickness: Nm): Section {
  const [legA, legB] = first >= second ? [first, second] : [second, first];
  const size = join(system, legA, legB, thickness);
  const table = system === 'US' ? US_ANGLE_LB_PER_FT[`L${size}`] : EN_ANGLE_KG_PER_M[size];
  return bar({
    name: system === 'US' ? `L${size}` : `L ${size}`,
    family: 'angle',
    system,
    dimensions: { legA, legB, thickness },
    mgPerM:
      table === undefined
        ? areaToMgPerM(angleArea(mm(legA), mm(legB), mm(thickness), system), system)
        : system === 'US'
          ? lbPerFtToMgPerM(table)
          : kgPerMToMgPerM(table),
    basis: table === undefined ? 'formula' : 'table',
  });
}

export function flat(system: System, first: Nm, second: Nm): Section {
  const [thickness, width] = first <= second ? [first, second] : [second, first];
  return bar({
    name: system === 'US' ? `FB ${join(system, thickness, width)}` : `FLT ${join(system, width, thickness)}`,
    family: 'flat',
    system,
    dimensions: { width, thickness },
    mgPerM: areaToMgPerM(mm(width) * mm(thickness), system),
    basis: 'formula',
  });
}

export const round = (system: System, diameter: Nm): Section =>
  bar({
    name: `${system === 'US' ? 'RB' : 'RND'} ${join(system, diameter)}`,
    family: 'round',
    system,
    dimensions: { diameter },
    mgPerM: areaToMgPerM(roundArea(mm(diameter)), system),
    basis: 'formula',
  });

export const square = (system: System, width: Nm): Section =>
  bar({
    name: `SQ ${join(system, width)}`,
    family: 'square',
    system,
    dimensions: { width },
    mgPerM: areaToMgPerM(mm(width) ** 2, system),
    basis: 'formula',
  });

export function tube(system: System, first: Nm, second: Nm, wall: Nm): Section {
  const [height, width] = first >= second ? [first, second] : [second, first];
  const prefix = system === 'US' ? 'HSS' : height === width ? 'SHS ' : 'RHS ';
  return bar({
    name: `${prefix}${join(system, height, width, wall)}`,
    family: 'tube',
    system,
    dimensions: { height, width, wall },
    mgPerM: areaToMgPerM(boxArea(mm(width), mm(height), mm(wall), system), system),
    basis: 'formula',
  });
}

const threeDecimals = (nm: Nm) => (nm / 25_400_000).toFixed(3);

export const roundTube = (system: System, diameter: Nm, wall: Nm): Section =>
  bar({
    name:
      system === 'US'
        ? `HSS${threeDecimals(diameter)}x${threeDecimals(wall)}`
        : `CHS ${join(system, diameter, wall)}`,
    family: 'round-tube',
    system,
    dimensions: { diameter, wall },
    mgPerM: areaToMgPerM(roundTubeArea(mm(diameter), mm(wall)), system),
    basis: 'formula',
  });

export type PipeClass = 'STD' | 'XS' | 'XXS';

/** Null when no such pipe is listed. */
export function pipe(nps: string, weight: PipeClass): Section | null {
  const entry = US_PIPE[nps];
  const row = entry?.[weight];
  if (!entry || !row) return null;
  const [wall, lbPerFt] = row;
  return bar({
    name: `PIPE ${nps} ${weight}`,
    family: 'pipe',
    system: 'US',
    dimensions: {
      diameter: asNm(Math.round(entry.od * 25_400_000)),
      wall: asNm(Math.round(wall * 25_400_000)),
    },
    mgPerM: lbPerFtToMgPerM(lbPerFt),
    basis: 'table',
  });
}

/** Birmingham wire gauge, the usual one of tube walls, in ten-thousandths of an inch (from memory; 16 ga = 0.065 in, not the sheet's 0.0598). */
export const TUBE_GAUGE: Readonly<Record<string, number>> = {
  '7': 1800,
  '8': 1650,
  '9': 1480,
  '10': 1340,
  '11': 1200,
  '12': 1090,
  '13': 950,
  '14': 830,
  '15': 720,
  '16': 650,
  '17': 580,
  '18': 490,
  '20': 350,
  '22': 280,
};

/** Null when the gauge is not one of tube. */
export function gaugeTube(first: Nm, second: Nm | null, gauge: string): Section | null {
  const tenThousandths = TUBE_GAUGE[gauge];
  if (tenThousandths === undefined) return null;
  const wall = asNm((tenThousandths * 25_400_000) / 10_000);
  if (second === null)
    return bar({
      name: `TUBE ${inchText(first)} OD x${gauge}GA`,
      family: 'gauge-tube',
      system: 'US',
      dimensions: { diameter: first, wall },
      mgPerM: areaToMgPerM(roundTubeArea(mm(first), mm(wall)), 'US'),
      basis: 'formula',
    });
  const [height, width] = first >= second ? [first, second] : [second, first];
  return bar({
    name: `TUBE ${inchText(height)}x${inchText(width)}x${gauge}GA`,
    family: 'gauge-tube',
    system: 'US',
    dimensions: { height, width, wall },
    mgPerM: areaToMgPerM(boxArea(mm(width), mm(height), mm(wall), 'US'), 'US'),
    basis: 'formula',
  });
}

/** Plate of a thickness; the caller adds width and length to the name as far as the cell told them. */
export function plate(system: System, thickness: Nm): Section {
  const key = system === 'US' ? `PL${inchText(thickness)}` : `PL ${mmText(thickness)}`;
  return {
    name: key,
    stockKey: key,
    family: 'plate',
    system,
    dimensions: { thickness },
    mass: { per: 'area', mgPerM2: thicknessToMgPerM2(thickness, system), basis: 'formula' },
  };
}

/** Null when that thickness of floor plate is not listed: its pattern adds mass that no formula gives. */
export function floorPlate(thickness: Nm): Section | null {
  const lbPerFt2 = FLOOR_PLATE_LB_PER_FT2[inchText(thickness)];
  if (lbPerFt2 === undefined) return null;
  const key = `FLOOR PL ${inchText(thickness)}`;
  return {
    name: key,
    stockKey: key,
    family: 'floor-plate',
    system: 'US',
    dimensions: { thickness },
    mass: { per: 'area', mgPerM2: lbPerFt2ToMgPerM2(lbPerFt2), basis: 'table' },
  };
}

/** Null when the gauge is not listed. */
export function sheet(gauge: string): Section | null {
  const row = SHEET_GAUGE[gauge];
  if (!row) return null;
  const key = `SHEET ${gauge} GA`;
  return {
    name: key,
    stockKey: key,
    family: 'sheet',
    system: 'US',
    dimensions: { thickness: asNm(Math.round(row[0] * 25_400_000)) },
    mass: { per: 'area', mgPerM2: lbPerFt2ToMgPerM2(row[1]), basis: 'table' },
  };
}
