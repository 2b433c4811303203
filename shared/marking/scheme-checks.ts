import { equals, fromFractionText, toFigures, type Exact } from '../chemistry/exact';
import { bandProblems, type SchemeProblem } from './bands';
import { readAnswer } from './read-answer';
import type { Asked, ItemScheme, Key } from './scheme';

/** The scheme an item starts with: the key and its one-decimal roundings count in full, no band, codes are asked about. */
export const defaultScheme = (asked: Asked, key: Key, maxGrains: number): ItemScheme => ({
  kind: 'numeric',
  asked,
  maxGrains,
  key,
  units: [],
  roundings: { downToDecimals: key.decimals > 1 ? 1 : null, truncation: false },
  alternatives: [],
  bands: [],
  crossedOut: 'ask',
  twoAnswers: 'ask',
});

function keyProblems({ text, decimals, figures }: Key, value: Exact): SchemeProblem[] {
  if (figures !== undefined) return text === toFigures(value, figures) ? [] : [{ path: 'key', message: `The printed key ${text} is not the computed value to ${figures} figures.` }];
  const read = readAnswer(text, []);
  if (!read.ok || !equals(read.value, value) || read.decimals !== decimals) {
    return [{ path: 'key', message: `The printed key ${text} is not the computed value to ${decimals} decimals.` }];
  }
  return [];
}

/** Everything that is wrong with a scheme, each by its place; an empty list means that it can be locked. */
export function schemeProblems(scheme: ItemScheme): SchemeProblem[] {
  const value = fromFractionText(scheme.key.value);
  const problems = [...keyProblems(scheme.key, value), ...bandProblems(scheme.bands, value, scheme.maxGrains)];
  if (!Number.isInteger(scheme.maxGrains) || scheme.maxGrains <= 0) problems.push({ path: 'maxGrains', message: 'An item is worth more than 0 marks.' });
  const { downToDecimals, downToFigures = null } = scheme.roundings;
  if (downToFigures !== null && (scheme.key.figures === undefined || downToFigures < 1 || downToFigures > scheme.key.figures)) {
    problems.push({ path: 'roundings.downToFigures', message: 'Roundings have at most the figures of the key.' });
  }
  if (scheme.key.figures === undefined && downToDecimals !== null && (downToDecimals < 0 || downToDecimals >= scheme.key.decimals)) {
    problems.push({ path: 'roundings.downToDecimals', message: 'Roundings have fewer decimals than the key.' });
  }
  return problems;
}
