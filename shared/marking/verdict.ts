import { equals, exactDecimals, fromFractionText, subtract, toDecimals, type Exact } from '../chemistry/exact';
import { bandOf, bandRange } from './bands';
import { slipsThatFit } from './diagnosis';
import { meets } from './meeting';
import { keyingStep } from './keying';
import { readAnswer, writtenNumber, type ReadValue } from './read-answer';
import { isCode, rules, type Code, type Given, type ItemScheme, type MarkingContext, type RuleName, type Verdict } from './scheme';

/** The context of a verdict as one text; two contexts with the same entries have the same. */
export const contextKey = (context: MarkingContext): string =>
  Object.keys(context).length === 0 ? '' : JSON.stringify(Object.entries(context).sort(([one], [other]) => (one < other ? -1 : 1)));

/** A difference as people read it: signed, exact where a decimal of up to six places says it. */
function distanceText(value: Exact, key: Exact): string {
  const distance = subtract(value, key);
  const places = Math.max(2, Math.min(6, exactDecimals(distance) ?? 6));
  return toDecimals(distance, places);
}

const codeVerdict = (scheme: ItemScheme, code: Code): Verdict => {
  const policies = { 'crossed-out': scheme.crossedOut, 'two-answers': scheme.twoAnswers } as const;
  const policy = code in policies ? policies[code as keyof typeof policies] : 'ask';
  const isWorthNothing = code === 'blank' || policy === 'none';
  return { grains: isWorthNothing ? 0 : null, rule: 'code', numbers: { code } };
};

type Claim = Verdict & { readonly grains: number };

function keyClaim(scheme: ItemScheme, read: ReadValue, key: Exact, shared: Record<string, string>): Claim | null {
  const met = meets(read, { value: key, decimals: scheme.key.decimals, figures: scheme.key.figures }, scheme.roundings);
  if (met === null) return null;
  return { grains: scheme.maxGrains, rule: met === 'exactly' ? 'key' : 'rounding', numbers: { ...shared, decimals: String(read.decimals) } };
}

const alternativeClaims = (scheme: ItemScheme, read: ReadValue, shared: Record<string, string>): Claim[] =>
  scheme.alternatives.flatMap((alternative): Claim[] => {
    const met = meets(read, { value: fromFractionText(alternative.value), decimals: alternative.decimals, figures: alternative.figures }, scheme.roundings);
    return met === null ? [] : [{ grains: alternative.grains, rule: 'alternative', numbers: { ...shared, name: alternative.name, alternative: alternative.text } }];
  });

function bandClaim(scheme: ItemScheme, read: ReadValue, key: Exact, shared: Record<string, string>): Claim | null {
  const band = bandOf(scheme.bands, key, read.value);
  if (!band) return null;
  const { from, to } = bandRange(band, key);
  const places = Math.max(scheme.key.decimals, exactDecimals(from) ?? 6);
  return { grains: band.grains, rule: 'band', numbers: { ...shared, band: band.name, from: toDecimals(from, places), to: toDecimals(to, places) } };
}

/** Every named slip that fits, with the same roundings as the key; one without a share explains a 0. The strongest share counts. */
function slipClaim(scheme: ItemScheme, read: ReadValue, shared: Record<string, string>): Claim | null {
  const fits = (scheme.slips ?? []).filter((slip) => meets(read, { value: fromFractionText(slip.value), decimals: scheme.key.decimals }, scheme.roundings) !== null);
  const [first] = fits;
  if (!first) return null;
  const grains = Math.max(...fits.map((slip) => slip.grains));
  return { grains, rule: 'slip', numbers: { ...shared, letters: fits.map(({ letter }) => letter).join(', '), slips: fits.map(({ name }) => name).join('; '), slip: first.text } };
}

/** What would explain a value that no rule pays: the slips it fits though the scheme names none; failing them, one wrong step of a reader's fingers. */
function explanation(scheme: ItemScheme, read: ReadValue, key: Exact): Record<string, string> {
  const fits = slipsThatFit(scheme, read);
  if (fits.length > 0) return { letters: fits.map(({ letter }) => letter).join(', '), slips: fits.map(({ name }) => name).join('; ') };
  const step = equals(read.value, key) ? null : keyingStep(writtenNumber(read), scheme.key.text);
  return step === null ? {} : { step };
}

const order = (rule: RuleName): number => rules.indexOf(rule);

/**
 * The verdict on one distinct reading: all rules are tried, the highest mark wins, a tie goes to the earlier rule, and the
 * winner with its numbers is the reason. It rests on the scheme, the form of the reading and the context, and on nothing else.
 * Key 6.10, three marks, roundings to one decimal: "6.1" is 3 marks by the rule `rounding`.
 */
export function markAnswer(scheme: ItemScheme, given: Given, _context: MarkingContext): Verdict {
  if (isCode(given)) return codeVerdict(scheme, given.code);
  const read = readAnswer(given.text, scheme.units);
  if (!read.ok) throw new RangeError(`Only what the grammar understands can be marked: ${given.text}`);
  const key = fromFractionText(scheme.key.value);
  const shared = { key: scheme.key.text, distance: distanceText(read.value, key) };
  const claims = [keyClaim(scheme, read, key, shared), ...alternativeClaims(scheme, read, shared), bandClaim(scheme, read, key, shared), slipClaim(scheme, read, shared)].filter((claim) => claim !== null);
  if (claims.length === 0) return { grains: 0, rule: 'nothing', numbers: { ...shared, ...explanation(scheme, read, key) } };
  return claims.reduce((best, claim) => (claim.grains > best.grains || (claim.grains === best.grains && order(claim.rule) < order(best.rule)) ? claim : best));
}
