/** What the item editor says at once of a scheme: sentences and parts of sentences, each with the name, the value, the distance. */

interface Found {
  readonly kind: 'slip' | 'convention';
  readonly name: string;
  readonly text: string;
  readonly distance: string;
  /** As a person reads them: `2`, `0.5`. */
  readonly marks: string;
}

const marksOf = (marks: string): string => `${marks} ${marks === '1' ? 'mark' : 'marks'}`;
const atDecimals = (decimals: number): string => (decimals === 1 ? 'one decimal' : decimals === 0 ? 'no decimal' : `${decimals} decimals`);
const list = (names: readonly string[]): string => names.join('; ');
const minus = (text: string): string => text.replace('-', '−');

export const watchWords = {
  /** `the slip “all inner electrons at 0.85”, 6.40, 0.30 above the key, would get 2 marks` */
  paid: ({ kind, name, text, distance, marks }: Found): string =>
    `${kind === 'slip' ? `the slip “${name}”, ${minus(text)}` : `${minus(text)}, ${name}`}, ${distance} the key, would get ${marksOf(marks)}`,
  /** A band outbids a share, so a share alone does not help. */
  paidAdvice: 'Narrow the band, unless these values are meant to have its marks.',
  /** `At one decimal, 3.8 cannot be told from 0.30 in every group, 3.80, 0.05 above the key.` */
  notToldApart: (slips: readonly { readonly name: string; readonly text: string; readonly distance: string }[], rounded: string, decimals: number): string =>
    `At ${atDecimals(decimals)}, ${minus(rounded)} cannot be told from ${list(slips.map(({ name, text, distance }) => `${name}, ${minus(text)}, ${distance} the key`))}.`,
  /** `all inner electrons at 0.85 gives 1.95 too; this item cannot see it.` */
  silent: (names: readonly string[], key: string): string =>
    `${list(names)} ${names.length === 1 ? 'gives' : 'give'} ${minus(key)} too; this item cannot see ${names.length === 1 ? 'it' : 'them'}.`,
  /** `0.35 inside 1s has no occasion on this item.` */
  noOccasion: (names: readonly string[]): string => `${list(names)} ${names.length === 1 ? 'has' : 'have'} no occasion on this item.`,
};
