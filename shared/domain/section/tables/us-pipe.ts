/**
 * Pipe by nominal size (ASME B36.10): outside diameter and wall in inches, published lb/ft by weight class.
 * XXS up to NPS 5: from memory.
 */
type Pipe = { readonly od: number } & Readonly<
  Partial<Record<'STD' | 'XS' | 'XXS', readonly [wall: number, lbPerFt: number]>>
>;

export const US_PIPE: Readonly<Record<string, Pipe>> = {
  '1/2': { od: 0.84, STD: [0.109, 0.85], XS: [0.147, 1.09], XXS: [0.294, 1.71] },
  '3/4': { od: 1.05, STD: [0.113, 1.13], XS: [0.154, 1.48], XXS: [0.308, 2.44] },
  '1': { od: 1.315, STD: [0.133, 1.68], XS: [0.179, 2.17], XXS: [0.358, 3.66] },
  '1-1/4': { od: 1.66, STD: [0.14, 2.27], XS: [0.191, 3], XXS: [0.382, 5.21] },
  '1-1/2': { od: 1.9, STD: [0.145, 2.72], XS: [0.2, 3.63], XXS: [0.4, 6.41] },
  '2': { od: 2.375, STD: [0.154, 3.66], XS: [0.218, 5.03], XXS: [0.436, 9.03] },
  '2-1/2': { od: 2.875, STD: [0.203, 5.8], XS: [0.276, 7.67], XXS: [0.552, 13.69] },
  '3': { od: 3.5, STD: [0.216, 7.58], XS: [0.3, 10.3], XXS: [0.6, 18.58] },
  '3-1/2': { od: 4, STD: [0.226, 9.12], XS: [0.318, 12.5] },
  '4': { od: 4.5, STD: [0.237, 10.8], XS: [0.337, 15], XXS: [0.674, 27.54] },
  '5': { od: 5.563, STD: [0.258, 14.6], XS: [0.375, 20.8], XXS: [0.75, 38.55] },
  '6': { od: 6.625, STD: [0.28, 19], XS: [0.432, 28.6], XXS: [0.864, 53.2] },
  '8': { od: 8.625, STD: [0.322, 28.6], XS: [0.5, 43.4], XXS: [0.875, 72.5] },
  '10': { od: 10.75, STD: [0.365, 40.5], XS: [0.5, 54.8], XXS: [1, 104] },
  '12': { od: 12.75, STD: [0.375, 49.6], XS: [0.5, 65.5], XXS: [1, 126] },
};
