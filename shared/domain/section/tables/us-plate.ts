/**
 * Floor plate weighs more than plain plate of its thickness, and sheet gauges follow the manufacturers standard
 * gauge (41.82 lb/ft2 per inch), so both come from the published tables.
 */
/** Thickness in inches as written → lb/ft2. */
export const FLOOR_PLATE_LB_PER_FT2: Readonly<Record<string, number>> = {
  '1/8': 6.16,
  '3/16': 8.71,
  '1/4': 11.26,
  '5/16': 13.81,
  '3/8': 16.37,
};

/** Gauge → uncoated thickness in inches, lb/ft2. */
export const SHEET_GAUGE: Readonly<Record<string, readonly [inches: number, lbPerFt2: number]>> = {
  '7': [0.1793, 7.5],
  '8': [0.1644, 6.875],
  '9': [0.1495, 6.25],
  '10': [0.1345, 5.625],
  '11': [0.1196, 5],
  '12': [0.1046, 4.375],
  '13': [0.0897, 3.75],
  '14': [0.0747, 3.125],
  '15': [0.0673, 2.812],
  '16': [0.0598, 2.5],
  '17': [0.0538, 2.25],
  '18': [0.0478, 2],
};
