/** The values of the visual language: colours by role, type, space, lines, sizes, motion. Nothing else in the app names a colour or a size of type. */

const light = {
  /** page ground */
  bench: '#EDF0EE',
  /** reading surface: panels, rows, fields */
  paper: '#FCFDFB',
  /** inset: pad function keys, tracks, disabled fill */
  well: '#E1E7E4',
  /** second surface: side lists, table head, key strip */
  glass: '#F4F7F5',
  /** divider, no meaning on its own */
  hair: '#CDD6D2',
  /** control walls and borders, minor graduations */
  rule: '#74817E',
  /** text, the scale line, chosen chip border */
  ink: '#15202B',
  /** secondary text, tube walls, icons */
  ink2: '#3F4D56',
  /** tertiary text, graduation numerals (not on mat) */
  ink3: '#57656B',
  /** the key: key value, band outline, liquid edge */
  copper: '#0A5A96',
  /** liquid of a computed mark; always with a copper edge */
  copperFluid: '#2F93D1',
  /** inner band, liquid of a column */
  copperMid: '#A5D2EE',
  /** outer band */
  copperFaint: '#DCEEF8',
  /** a hand: readings, focus, selection, rulings */
  manganate: '#7A1868',
  /** drop and bead fill, liquid of a ruled mark; always with a manganate edge */
  manganateFluid: '#A63A92',
  /** ground of a chosen row or option */
  manganateFaint: '#F7E6F3',
  /** undecided: discordant, held, set aside, cannot read, disputed, loose */
  iodine: '#824A00',
  /** small fills, always with an iodine edge */
  iodineFluid: '#D98A14',
  /** ground of an undecided count */
  iodineFaint: '#FBEDD3',
  /** broken: failed upload, invalid value, discard */
  methyl: '#AE1F2B',
  /** ground of a failure notice */
  methylFaint: '#FBE6E5',
  /** primary button fill */
  action: '#7A1868',
  /** primary button fill, pressed or hovered */
  actionDown: '#62104F',
  /** text on action */
  onFill: '#FFFFFF',
  /** ground around a scan */
  mat: '#D3DBD7',
  /** behind a sheet, at 40 per cent */
  scrim: '#15202B',
} as const;

export type ColorRole = keyof typeof light;
export type Colors = Readonly<Record<ColorRole, string>>;

const dark: Colors = {
  bench: '#0E1519',
  paper: '#172026',
  well: '#0A1013',
  glass: '#1E282F',
  hair: '#2C3940',
  rule: '#728189',
  ink: '#EAF0EE',
  ink2: '#BAC6C8',
  ink3: '#94A3A8',
  copper: '#7CC2F2',
  copperFluid: '#2F86C4',
  copperMid: '#1F5780',
  copperFaint: '#163345',
  manganate: '#EBA4DD',
  manganateFluid: '#B94FA5',
  manganateFaint: '#3A1F36',
  iodine: '#F2BA5C',
  iodineFluid: '#C98416',
  iodineFaint: '#3A2A10',
  methyl: '#FF9A92',
  methylFaint: '#401C1E',
  action: '#AE489D',
  actionDown: '#93397F',
  onFill: '#FFFFFF',
  mat: '#070B0D',
  scrim: '#000000',
};

export const palettes = { light: light as Colors, dark } as const;

/** A toast is dark in both themes. */
export const toastColors = {
  light: { ground: '#15202B', text: '#FCFDFB', border: '#15202B' },
  dark: { ground: '#1E282F', text: '#EAF0EE', border: '#728189' },
} as const;

/** Families as fonts.ts loads them, one face a weight. */
export const faces = {
  Next400: 'Next-Regular',
  Next500: 'Next-Medium',
  Next600: 'Next-SemiBold',
  Mono400: 'Mono-Regular',
  Mono500: 'Mono-Medium',
  Mono600: 'Mono-SemiBold',
  Stix: 'Stix-Italic',
} as const;
export type Face = keyof typeof faces;

export const type = {
  display: { face: 'Next600', size: 28, line: 34, tracking: -0.3 },
  title: { face: 'Next600', size: 21, line: 28, tracking: -0.15 },
  head: { face: 'Next600', size: 17, line: 24, tracking: 0 },
  body: { face: 'Next400', size: 16, line: 24, tracking: 0 },
  small: { face: 'Next400', size: 14, line: 20, tracking: 0 },
  label: { face: 'Next500', size: 13, line: 16, tracking: 0 },
  micro: { face: 'Next400', size: 12, line: 16, tracking: 0 },
  total: { face: 'Next600', size: 44, line: 48, tracking: 0 },
  readingXL: { face: 'Mono500', size: 50, line: 60, tracking: 0 },
  readingL: { face: 'Mono500', size: 36, line: 44, tracking: 0 },
  readingM: { face: 'Mono500', size: 21, line: 28, tracking: 0 },
  reading: { face: 'Mono500', size: 16, line: 22, tracking: 0 },
  readingS: { face: 'Mono500', size: 15, line: 20, tracking: 0 },
  grad: { face: 'Mono400', size: 12, line: 16, tracking: 0 },
  keycap: { face: 'Mono500', size: 12, line: 16, tracking: 0 },
} as const satisfies Record<string, { face: Face; size: number; line: number; tracking: number }>;
export type TypeStyle = keyof typeof type;

export const symbolScale = 1.1;
export const raise = { size: 0.7, rise: 0.5 } as const;
export const lower = { size: 0.72, drop: 0.28 } as const;

/** space[4] is 16. */
export const space = [0, 4, 8, 12, 16, 20, 24, 32, 44, 64] as const;

export const radius = { scan: 2, keycap: 5, control: 8, pad: 10, toast: 10, vessel: 12, chip: 20 } as const;

export const line = { hair: 1, control: 1.5, focus: 2, scale: 1.75, tubeS: 1.5, tubeL: 2 } as const;

export const size = {
  touch: 44,
  touchWide: 36,
  padKey: 50,
  button: 44,
  buttonLarge: 52,
  field: 48,
  fieldReading: 52,
  fieldReadingWide: 84,
  rowWide: 40,
  chip: 40,
  chipWide: 34,
  topBar: 56,
  topBarWide: 60,
  tabBar: 66,
  column: 200,
  columnSlim: 64,
  sheet: 412,
  tubeS: 26,
  tubeM: 38,
  tubeL: 96,
} as const;

export const breakpoint = { phone: 0, middle: 720, wide: 1080, full: 1600 } as const;

/** What lifts: a scan off its mat, a side sheet to its left, a toast. Nothing else has a shadow. */
export const shadow = {
  scan: '0 1px 3px rgba(10, 20, 30, 0.18)',
  sheet: '-10px 0 28px rgba(10, 20, 30, 0.12)',
  toast: '0 6px 20px rgba(10, 20, 30, 0.22)',
} as const;

export const curves = { settle: 'cubic-bezier(0.2, 0.8, 0.2, 1)', slide: 'cubic-bezier(0.2, 0, 0, 1)', fade: 'linear' } as const;

export const motion = { settleMs: 240, slideMs: 200, fadeMs: 120, toastStayMs: 8000, loadingWordsMs: 400 } as const;
