import { equals, exactDecimals, fromFractionText, toDecimals, type Exact } from '../../shared/chemistry/exact';
import { leadingExponent, roundings, truncation } from '../../shared/marking/rounding';
import type { ItemScheme } from '../../shared/marking/scheme';

/** What an answer is compared with: the key, an alternative, or a slip. */
interface Target {
  readonly value: string;
  readonly decimals: number;
  readonly figures?: number | undefined;
}

/** A value that no short decimal says can be written ever longer; so many places beyond the stated ones are listed. */
const furtherPlaces = 4;

/** The places to which a target may be given and still count. */
function placesOf(exact: Exact, { decimals, figures }: Target, { downToDecimals, downToFigures }: ItemScheme['roundings']): { from: number; upTo: number } | null {
  if (figures !== undefined) {
    const shift = leadingExponent(exact) + 1;
    return { from: (downToFigures ?? figures) - shift, upTo: figures - shift + furtherPlaces };
  }
  if (downToDecimals === null) return null;
  return { from: downToDecimals, upTo: exactDecimals(exact) === null ? decimals + furtherPlaces : decimals - 1 };
}

/** Every number that counts as a target, as decimals, itself first: of 61/10 to one decimal 6.10 alone, of 91/20 also 4.5 and 4.6. */
export function valuesThatCount(target: Target, policy: ItemScheme['roundings']): string[] {
  const exact = fromFractionText(target.value);
  const isWritable = target.figures === undefined && exactDecimals(exact) !== null;
  const found: { value: Exact; text: string }[] = isWritable ? [{ value: exact, text: toDecimals(exact, Math.max(target.decimals, exactDecimals(exact) ?? 0)) }] : [];
  const places = placesOf(exact, target, policy);
  for (let place = places?.upTo ?? -1; places !== null && place >= places.from; place -= 1) {
    const given = [...roundings(exact, place), ...(policy.truncation ? [truncation(exact, place)] : [])];
    for (const value of given) if (!found.some((known) => equals(known.value, value))) found.push({ value, text: toDecimals(value, Math.max(0, place)) });
  }
  return found.map(({ text }) => text);
}
