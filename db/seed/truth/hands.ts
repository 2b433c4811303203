import type { Random } from './random';

export const handFonts = ['caveat', 'kalam-light', 'kalam', 'gochi', 'reenie', 'nothing'] as const;
export type HandFont = (typeof handFonts)[number];

export const pens = ['blue', 'black', 'pencil'] as const;
export type Pen = (typeof pens)[number];

/** How one candidate writes: the same on every page. */
export interface Hand {
  readonly font: HandFont;
  readonly pen: Pen;
  readonly strokeMm: number;
  /** Height of a digit in the answer box. */
  readonly digitMm: number;
  /** Leaning forward is positive. */
  readonly slantDegrees: number;
  /** Letter spacing as a factor of the font's own. */
  readonly spread: number;
  /** 0 for a calm hand, 1 for a restless one: scales every jitter. */
  readonly unrest: number;
}

const rounded = (value: number, places: number): number => {
  const scale = 10 ** places;
  return Math.round(value * scale) / scale;
};

/** One invented hand. Four in ten write blue, four black, two with a pencil. */
export function handFrom(random: Random): Hand {
  const pen = random.pickWeighted<Pen>([
    { weight: 44, choice: 'blue' },
    { weight: 38, choice: 'black' },
    { weight: 18, choice: 'pencil' },
  ]);
  return {
    font: random.pick(handFonts),
    pen,
    strokeMm: rounded(random.between(0.42, pen === 'pencil' ? 0.58 : 0.72), 3),
    digitMm: rounded(random.between(6.2, 9.4), 2),
    slantDegrees: rounded(random.between(-4, 9), 2),
    spread: rounded(random.between(0.92, 1.14), 3),
    unrest: rounded(random.between(0.35, 1), 3),
  };
}
