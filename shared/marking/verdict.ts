import { equals, fromFractionText } from '../chemistry/exact';
import { claimsOn, distanceText, valueGrains, type Claim } from './claims';
import { completeScheme } from './complete-scheme';
import { slipsThatFit } from './diagnosis';
import { keyingStep } from './keying';
import { inPlace } from './printed-numbers';
import { writtenNumber, type ReadValue } from './read-answer';
import { readTyped } from './read-typed';
import { isCode, rules, type Code, type CompleteScheme, type Given, type ItemScheme, type MarkingContext, type RuleName, type Verdict } from './scheme';

const codeVerdict = (scheme: CompleteScheme, code: Code): Verdict => {
  const policies = { 'crossed-out': scheme.crossedOut, 'two-answers': scheme.twoAnswers } as const;
  const policy = code in policies ? policies[code as keyof typeof policies] : 'ask';
  const isWorthNothing = code === 'blank' || policy === 'none';
  return { grains: isWorthNothing ? 0 : null, rule: 'code', numbers: { code } };
};

/** What would explain a value that no rule pays: the slips it fits though the scheme names none; failing them, one wrong step of a reader's fingers. */
function explanation(scheme: CompleteScheme, read: ReadValue): Record<string, string> {
  const fits = slipsThatFit(scheme, read);
  if (fits.length > 0) return { letters: fits.map(({ letter }) => letter).join(', '), slips: fits.map(({ name }) => name).join('; ') };
  const step = equals(read.value, fromFractionText(scheme.key.value)) ? null : keyingStep(writtenNumber(read), scheme.key.text);
  return step === null ? {} : { step };
}

const order = (rule: RuleName): number => rules.indexOf(rule);

const isBetter = (claim: Claim, best: Claim): boolean => claim.grains > best.grains || (claim.grains === best.grains && order(claim.rule) < order(best.rule));

function numericVerdict(scheme: CompleteScheme, read: ReadValue, context: MarkingContext): Claim {
  const [first, ...rest] = claimsOn(scheme, read, context);
  if (first) return rest.reduce((best, claim) => (isBetter(claim, best) ? claim : best), first);
  const shared = { key: scheme.key.text, distance: distanceText(read.value, fromFractionText(scheme.key.value), scheme.key.figures) };
  return { grains: 0, rule: 'nothing', numbers: { ...shared, ...explanation(scheme, read) } };
}

/** An alternative of a choice or an order is met by its own numbers; a part mark by the most numbers in place that the table names. */
function printedVerdict(scheme: CompleteScheme, read: ReadValue): Claim {
  const answer = scheme.printed?.answer ?? scheme.key.text;
  const shared = { key: answer };
  if (read.canonical === answer) return { grains: valueGrains(scheme), rule: 'key', numbers: shared };
  const right = inPlace(read.canonical, answer);
  const claims: Claim[] = [
    ...scheme.alternatives.filter(({ text }) => text === read.canonical).map(({ name, text, grains }): Claim => ({ grains, rule: 'alternative', numbers: { ...shared, name, alternative: text } })),
    ...(scheme.printed?.partMarks ?? []).filter((part) => part.inPlace <= right).map(({ grains }): Claim => ({ grains, rule: 'part', numbers: { ...shared, inPlace: String(right), of: String(answer.split(' ').length) } })),
  ];
  const nothing: Claim = { grains: 0, rule: 'nothing', numbers: { ...shared, inPlace: String(right), of: String(answer.split(' ').length) } };
  return claims.reduce((best, claim) => (isBetter(claim, best) ? claim : best), nothing);
}

/** Method marks are struck beside the value and added to it; a mark that waits for a person waits with them. */
function withMethod(scheme: CompleteScheme, verdict: Verdict, { method }: MarkingContext): Verdict {
  const struck = (method ?? '').split(',').filter((id) => id !== '');
  if (struck.length === 0 || verdict.grains === null) return verdict;
  const marks = scheme.methodMarks.filter(({ id }) => struck.includes(id));
  const grains = marks.reduce((sum, mark) => sum + mark.grains, 0);
  return { ...verdict, grains: verdict.grains + grains, numbers: { ...verdict.numbers, method: marks.map(({ text }) => text).join('; '), methodGrains: String(grains) } };
}

/**
 * The verdict on one distinct reading: all rules are tried, the highest mark wins, a tie goes to the earlier rule, and the
 * winner with its numbers is the reason. It rests on the scheme, the form of the reading and the context, and on nothing else.
 * Key 6.10, three marks, roundings to one decimal: "6.1" is 3 marks by the rule `rounding`.
 */
export function markAnswer(stored: ItemScheme, given: Given, context: MarkingContext): Verdict {
  const scheme = completeScheme(stored);
  if (scheme.withdrawn !== 'none') return { grains: scheme.withdrawn === 'full' ? scheme.maxGrains : 0, rule: 'withdrawn', numbers: { withdrawn: scheme.withdrawn } };
  if (isCode(given)) return withMethod(scheme, codeVerdict(scheme, given.code), context);
  const read = readTyped(given.text, scheme);
  if (!read.ok) throw new RangeError(`Only what the grammar understands can be marked: ${given.text}`);
  return withMethod(scheme, scheme.kind === 'numeric' ? numericVerdict(scheme, read, context) : printedVerdict(scheme, read), context);
}

/**
 * Whether a mark could still rise once the item it follows from is settled: it waits until then. Not one that has all the value
 * can give, nor one that a person decides.
 */
export function couldRise(stored: ItemScheme, { grains, rule, numbers }: Verdict): boolean {
  const scheme = completeScheme(stored);
  if (!scheme.followThrough || scheme.followThrough.isTrivial || rule === 'withdrawn' || rule === 'code' || grains === null) return false;
  return grains - Number(numbers.methodGrains ?? 0) < valueGrains(scheme);
}
