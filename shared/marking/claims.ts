import { exactDecimals, fromFractionText, negate, subtract, toDecimals, toFigures, type Exact } from '../chemistry/exact';
import { bandOf, bandRange } from './bands';
import { carriedKey } from './follow-through';
import { meets } from './meeting';
import type { ReadValue } from './read-answer';
import type { CompleteScheme, MarkingContext, RuleName } from './scheme';

/** What one rule would give. */
export interface Claim {
  readonly grains: number;
  readonly rule: RuleName;
  readonly numbers: Readonly<Record<string, string>>;
}

type Numbers = Readonly<Record<string, string>>;

/** A difference as people read it: signed, exact where a decimal of up to six places says it; from a key stated to figures, to three. */
export function distanceText(value: Exact, key: Exact, figures?: number): string {
  const distance = subtract(value, key);
  if (figures !== undefined && distance.n !== 0n) return toFigures(distance, 3);
  const places = Math.max(2, Math.min(6, exactDecimals(distance) ?? 6));
  return toDecimals(distance, places);
}

/** The most the value itself gives: the item less its method marks. */
export const valueGrains = ({ maxGrains, methodMarks }: CompleteScheme): number => maxGrains - methodMarks.reduce((sum, { grains }) => sum + grains, 0);

function keyClaim(scheme: CompleteScheme, read: ReadValue, key: Exact, shared: Numbers): Claim | null {
  const met = meets(read, { value: key, decimals: scheme.key.decimals, figures: scheme.key.figures }, scheme.roundings);
  if (met === null) return null;
  return { grains: valueGrains(scheme), rule: met === 'exactly' ? 'key' : 'rounding', numbers: { ...shared, decimals: String(read.decimals) } };
}

const alternativeClaims = (scheme: CompleteScheme, read: ReadValue, shared: Numbers): Claim[] =>
  scheme.alternatives.flatMap((alternative): Claim[] => {
    const met = meets(read, { value: fromFractionText(alternative.value), decimals: alternative.decimals, figures: alternative.figures }, scheme.roundings);
    return met === null ? [] : [{ grains: alternative.grains, rule: 'alternative', numbers: { ...shared, name: alternative.name, alternative: alternative.text } }];
  });

function bandClaim(scheme: CompleteScheme, read: ReadValue, key: Exact, shared: Numbers): Claim | null {
  const band = bandOf(scheme.bands, key, read.value);
  if (!band) return null;
  const { from, to } = bandRange(band, key);
  const places = Math.max(scheme.key.decimals, exactDecimals(from) ?? 6);
  return { grains: band.grains, rule: 'band', numbers: { ...shared, band: band.name, from: toDecimals(from, places), to: toDecimals(to, places) } };
}

/** Every named slip that fits, with the same roundings as the key; one without a share explains a 0. The strongest share counts. */
function slipClaim(scheme: CompleteScheme, read: ReadValue, shared: Numbers): Claim | null {
  const fits = scheme.slips.filter((slip) => meets(read, { value: fromFractionText(slip.value), decimals: scheme.key.decimals, figures: slip.figures === undefined ? undefined : scheme.key.figures }, scheme.roundings) !== null);
  const [first] = fits;
  if (!first) return null;
  const grains = Math.max(...fits.map((slip) => slip.grains));
  return { grains, rule: 'slip', numbers: { ...shared, letters: fits.map(({ letter }) => letter).join(', '), slips: fits.map(({ name }) => name).join('; '), slip: first.text } };
}

/** Rules 2, 3 and 5 on the key worked again from the candidate's own value. A carried value with more decimals than the key states may be given to the key's. */
function followClaims(scheme: CompleteScheme, read: ReadValue, context: MarkingContext, shared: Numbers): Claim[] {
  const carried = carriedKey(scheme, context);
  if (carried === null) return [];
  const { decimals, figures } = scheme.key;
  const exactPlaces = exactDecimals(carried) ?? decimals;
  const policy = exactPlaces > decimals ? { ...scheme.roundings, downToDecimals: scheme.roundings.downToDecimals ?? decimals } : scheme.roundings;
  const numbers = { ...shared, followed: context.followed ?? '', carried: toDecimals(carried, Math.max(decimals, Math.min(6, exactPlaces))), carriedDistance: distanceText(read.value, carried, figures) };
  const isMet = meets(read, { value: carried, decimals: Math.max(decimals, exactPlaces), figures }, policy) !== null;
  const band = bandClaim(scheme, read, carried, numbers);
  return [
    ...(isMet ? [{ grains: valueGrains(scheme), rule: 'follow-through' as const, numbers }] : []),
    ...(band ? [{ ...band, rule: 'follow-through' as const }] : []),
  ];
}

/** What each rule of value would give a number, as it is written. */
function valueClaims(scheme: CompleteScheme, read: ReadValue, context: MarkingContext): Claim[] {
  const key = fromFractionText(scheme.key.value);
  const shared = { key: scheme.key.text, distance: distanceText(read.value, key, scheme.key.figures) };
  return [
    keyClaim(scheme, read, key, shared),
    ...alternativeClaims(scheme, read, shared),
    bandClaim(scheme, read, key, shared),
    ...followClaims(scheme, read, context, shared),
    slipClaim(scheme, read, shared),
  ].filter((claim) => claim !== null);
}

/** Where the scheme has a rule for signs: the same value with the other sign, less what a lost sign costs. */
function signClaims(scheme: CompleteScheme, read: ReadValue, context: MarkingContext): Claim[] {
  if (!scheme.signRule || read.value.n === 0n) return [];
  const cost = context.sign === 'charged' ? 0 : scheme.signRule.grains;
  const key = fromFractionText(scheme.key.value);
  return valueClaims(scheme, { ...read, value: negate(read.value) }, context)
    .filter(({ rule }) => rule !== 'slip')
    .map((claim) => ({
      ...claim,
      grains: Math.max(0, claim.grains - cost),
      numbers: { ...claim.numbers, distance: distanceText(read.value, key, scheme.key.figures), sign: 'reversed', signCost: String(Math.min(cost, claim.grains)) },
    }));
}

/** Less what a missing or another unit costs. */
function withUnit(scheme: CompleteScheme, read: ReadValue, context: MarkingContext, claim: Claim): Claim {
  const [wanted] = scheme.units;
  if (!scheme.unitRule || wanted === undefined || read.unit === wanted) return claim;
  const cost = context.unit === 'charged' ? 0 : Math.min(scheme.unitRule.grains, claim.grains);
  return { ...claim, grains: claim.grains - cost, numbers: { ...claim.numbers, unit: read.unit ?? '', unitWanted: wanted, unitCost: String(cost) } };
}

/** Another unit than that of the key makes another value, unless the scheme has a rule for units; a missing one does not. */
const isOtherValue = ({ units: [wanted], unitRule }: CompleteScheme, { unit }: ReadValue): boolean => unitRule === null && unit !== null && unit !== wanted;

/** Every claim on a number, costs of unit and sign taken off. */
export const claimsOn = (scheme: CompleteScheme, read: ReadValue, context: MarkingContext): Claim[] =>
  isOtherValue(scheme, read) ? [] : [...valueClaims(scheme, read, context), ...signClaims(scheme, read, context)].map((claim) => withUnit(scheme, read, context, claim));
