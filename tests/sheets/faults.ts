import type { Random } from '../../db/seed/truth/random';

/** How a sheet got into pixels. Lengths on paper in millimetres, lengths in the picture in pixels. */
export interface Faults {
  readonly dpi: number;
  readonly turnDegrees: number;
  readonly scale: number;
  /** By how much the far edge of the sheet is smaller than the near one, across and down. */
  readonly aslant: readonly [number, number];
  /** Paper that does not lie flat moves its points by this much. */
  readonly waveMm: number;
  /** Empty picture round the sheet, as on a table; 0 for the glass of a scanner, which crops. */
  readonly round: number;
  readonly background: number;
  readonly isMirrored: boolean;
  readonly isNegative: boolean;
  readonly contrast: number;
  /** Share of the light lost at the dark end. */
  readonly fading: number;
  readonly blurPx: number;
  readonly noise: number;
  readonly isBilevel: boolean;
  readonly jpeg: number;
  readonly stainedCodes: number;
  readonly inkedCodes: number;
  readonly cutCornerMm: number;
  readonly isPunched: boolean;
}

const flat: Faults = {
  dpi: 200,
  turnDegrees: 0,
  scale: 1,
  aslant: [0, 0],
  waveMm: 0,
  round: 0,
  background: 236,
  isMirrored: false,
  isNegative: false,
  contrast: 1,
  fading: 0,
  blurPx: 0.4,
  noise: 2,
  isBilevel: false,
  jpeg: 85,
  stainedCodes: 0,
  inkedCodes: 0,
  cutCornerMm: 0,
  isPunched: false,
};

const slant = (random: Random, most: number): Pick<Faults, 'aslant'> => ({ aslant: [random.between(-most, most), random.between(-most, most)] });
const skew = (random: Random, most: number): number => random.between(-most, most);

/** Each within what the design says can be read. */
export const scenarios: Readonly<Record<string, (random: Random) => Faults>> = {
  clean: () => ({ ...flat, blurPx: 0, noise: 0, jpeg: 95 }),
  'quarter turns': (random) => ({ ...flat, turnDegrees: 90 * random.whole(1, 3) + skew(random, 1) }),
  'skew of 3 degrees': (random) => ({ ...flat, turnDegrees: skew(random, 3) }),
  'skew of 7 to 10 degrees, cropped': (random) => ({ ...flat, turnDegrees: random.between(7, 10) * random.pick([-1, 1]) }),
  'nine tenths': (random) => ({ ...flat, scale: 0.9, turnDegrees: skew(random, 2) }),
  'eleven tenths': (random) => ({ ...flat, scale: 1.1, round: 0.06, turnDegrees: skew(random, 1) }),
  '150 dpi': (random) => ({ ...flat, dpi: 150, turnDegrees: skew(random, 2) }),
  noise: (random) => ({ ...flat, noise: 20, turnDegrees: skew(random, 2) }),
  'blur and JPEG 30': (random) => ({ ...flat, blurPx: 1.4, jpeg: 30, turnDegrees: skew(random, 2) }),
  'low contrast': (random) => ({ ...flat, contrast: 0.4, turnDegrees: skew(random, 2) }),
  'fading light': (random) => ({ ...flat, fading: random.between(0.3, 0.55), turnDegrees: skew(random, 2) }),
  'black and white': (random) => ({ ...flat, isBilevel: true, turnDegrees: skew(random, 2) }),
  'stain on a code': (random) => ({ ...flat, stainedCodes: 1, turnDegrees: skew(random, 2) }),
  'stains on two codes': (random) => ({ ...flat, stainedCodes: 2, turnDegrees: skew(random, 2) }),
  'pen over two codes': (random) => ({ ...flat, inkedCodes: 2, turnDegrees: skew(random, 2) }),
  'pen over three codes': (random) => ({ ...flat, inkedCodes: 3, turnDegrees: skew(random, 2) }),
  'cut corner': (random) => ({ ...flat, cutCornerMm: random.between(25, 45), turnDegrees: skew(random, 2) }),
  'punched and faint': (random) => ({ ...flat, isPunched: true, contrast: 0.75, noise: 6, turnDegrees: skew(random, 1.5) }),
  phone: (random) => ({ ...flat, ...slant(random, 0.05), turnDegrees: skew(random, 4), round: 0.06, background: 90, fading: 0.25, blurPx: 0.8, noise: 5, jpeg: 75 }),
  'phone, paper not flat': (random) => ({ ...flat, ...slant(random, 0.08), waveMm: 0.8, turnDegrees: skew(random, 6), round: 0.06, background: 90, fading: 0.4, blurPx: 1.1, noise: 8, jpeg: 60 }),
  mirrored: (random) => ({ ...flat, isMirrored: true, turnDegrees: skew(random, 2) }),
  negative: (random) => ({ ...flat, isNegative: true, turnDegrees: skew(random, 2) }),
  mixed: (random) => ({ ...flat, turnDegrees: skew(random, 3), scale: random.between(0.92, 1.02), stainedCodes: 1, inkedCodes: 1, fading: 0.25, blurPx: 1, noise: 8, jpeg: 50 }),
};
