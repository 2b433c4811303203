import { absolute, compare, exactDecimals, fromFractionText, subtract, toDecimals, type Exact } from '../../shared/chemistry/exact';
import { bandRange } from '../../shared/marking/bands';
import type { Band, ItemScheme } from '../../shared/marking/scheme';
import { valuesThatCount } from './qti-values';

/** What earns a mark without a person: one of some numbers, or a number no farther from the key than a tolerance. */
export type Claim = { readonly grains: number } & ({ readonly numbers: readonly string[] } | { readonly key: string; readonly tolerance: string; readonly ends: readonly [string, string] });

const text = (value: Exact, atLeast: number): string => toDecimals(value, Math.max(atLeast, exactDecimals(value) ?? 12));

function bandClaim(band: Band, { key }: ItemScheme): { width: Exact; claim: Claim } {
  const value = fromFractionText(key.value);
  const { from, to } = bandRange(band, value);
  const width = absolute(subtract(to, value));
  return { width, claim: { grains: band.grains, key: text(value, key.decimals), tolerance: text(width, 0), ends: [text(from, key.decimals), text(to, key.decimals)] } };
}

/** All that pays, the best first and of equals in the order of the rules; what fits none of it earns 0. */
export function claimsOf(scheme: ItemScheme): Claim[] {
  const { key, roundings, alternatives, slips = [], maxGrains } = scheme;
  const bands = scheme.bands.map((band) => bandClaim(band, scheme)).sort((one, other) => compare(one.width, other.width));
  const claims: Claim[] = [
    { grains: maxGrains, numbers: valuesThatCount(key, roundings) },
    ...alternatives.map((alternative) => ({ grains: alternative.grains, numbers: valuesThatCount(alternative, roundings) })),
    ...bands.map(({ claim }) => claim),
    ...slips.map((slip) => ({ grains: slip.grains, numbers: valuesThatCount({ value: slip.value, decimals: key.decimals }, roundings) })),
  ];
  return claims.filter((claim) => claim.grains > 0 && (!('numbers' in claim) || claim.numbers.length > 0)).sort((one, other) => other.grains - one.grains);
}
