/** What a bar map is made of, in paper millimetres, y down. Drawn alike by canvas on screen and by SVG on paper. */
export type Tone = 'ink' | 'cut' | 'faint';
export type Fill = 'none' | 'ink' | 'chalk' | 'soap';

export type Shape =
  | {
      readonly kind: 'line';
      readonly x1: number;
      readonly y1: number;
      readonly x2: number;
      readonly y2: number;
      readonly weight: number;
      readonly tone: Tone;
    }
  | {
      readonly kind: 'polygon';
      readonly points: readonly (readonly [number, number])[];
      readonly fill: Fill;
      readonly weight: number;
    }
  | {
      readonly kind: 'circle';
      readonly cx: number;
      readonly cy: number;
      readonly r: number;
      readonly fill: Fill;
      readonly weight: number;
    }
  | {
      readonly kind: 'text';
      readonly x: number;
      /** Baseline. */
      readonly y: number;
      readonly text: string;
      readonly size: number;
      readonly align: 'left' | 'center' | 'right';
      readonly font: 'mono' | 'head';
      readonly bold: boolean;
      readonly tone: Tone;
      /** Stands on this piece, and turns pale with it when it is filled. */
      readonly piece?: number;
    };

/** Where a piece lies on the drawing, for pointing at it and filling it. */
export type PieceField = {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
};

export type BarMap = {
  readonly width: number;
  readonly height: number;
  readonly shapes: readonly Shape[];
  readonly pieces: readonly PieceField[];
};

/** Width of a line of text: 0.6 em a letter in the mono face, 0.46 in the condensed one. */
export const textWidth = (text: string, size: number, font: 'mono' | 'head' = 'mono'): number =>
  text.length * size * (font === 'mono' ? 0.6 : 0.46);
