/**
 * W shapes by nominal depth in inches and lb/ft: the last number of the name is the weight.
 */
export const US_W: Readonly<Record<string, readonly string[]>> = {
  '4': ['13'],
  '5': ['16', '19'],
  '6': ['9', '12', '15', '16', '20', '25'],
  '8': ['10', '13', '15', '18', '21', '24', '28', '31', '35', '40', '48', '58', '67'],
  '10': ['12', '15', '17', '19'],
};
