import { equals, fromFractionText, toFigures, type Exact } from '../chemistry/exact';
import { bandProblems, type SchemeProblem } from './bands';
import { valueGrains } from './claims';
import { completeScheme } from './complete-scheme';
import { readAnswer } from './read-answer';
import type { Asked, CompleteScheme, ItemScheme, Key } from './scheme';

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

const isShare = (grains: number, most: number): boolean => Number.isInteger(grains) && grains >= 0 && grains <= most;

/** Shares of what the value can give: of alternatives and slips, and what a unit or a sign costs. */
function shareProblems({ alternatives, slips, unitRule, signRule, units }: CompleteScheme, most: number): SchemeProblem[] {
  const tooMuch = (path: string): SchemeProblem => ({ path, message: 'No more than the value is worth: the marks of the item less its method marks.' });
  return [
    ...alternatives.flatMap(({ grains }, index) => (isShare(grains, most) ? [] : [tooMuch(`alternatives.${index}.grains`)])),
    ...slips.flatMap(({ grains }, index) => (isShare(grains, most) ? [] : [tooMuch(`slips.${index}.grains`)])),
    ...(unitRule && !isShare(unitRule.grains, most) ? [tooMuch('unitRule.grains')] : []),
    ...(signRule && !isShare(signRule.grains, most) ? [tooMuch('signRule.grains')] : []),
    ...(unitRule && units.length === 0 ? [{ path: 'unitRule.grains', message: 'The key is a pure number: no unit can be missing.' }] : []),
  ];
}

function methodProblems({ methodMarks }: CompleteScheme, most: number): SchemeProblem[] {
  const ids = methodMarks.map(({ id }) => id);
  const twice = ids.findIndex((id, index) => ids.indexOf(id) !== index);
  return [
    ...(most <= 0 ? [{ path: 'methodMarks', message: 'Method marks take less than the item is worth: the value needs a mark of its own.' }] : []),
    ...(twice >= 0 ? [{ path: `methodMarks.${twice}.id`, message: 'Two method marks have the same id.' }] : []),
  ];
}

/** A part mark for more numbers in place gives more, and less than all of them. */
function partProblems({ printed, kind }: CompleteScheme, most: number): SchemeProblem[] {
  if (kind === 'numeric') return [];
  if (!printed) return [{ path: 'printed', message: 'Print two options or more.' }];
  const { partMarks, options } = printed;
  return partMarks.flatMap(({ inPlace, grains }, index): SchemeProblem[] => {
    const path = `printed.partMarks.${index}`;
    // All but one in place are all in place.
    if (inPlace > options.length - 2) return [{ path: `${path}.inPlace`, message: `At most ${options.length - 2} of ${options.length} can be in place without all being so.` }];
    const fewer = partMarks.find((other) => other.inPlace < inPlace && other.grains >= grains);
    const same = partMarks.findIndex((other) => other.inPlace === inPlace) < index;
    if (same) return [{ path: `${path}.inPlace`, message: 'There is a part mark for as many in place already.' }];
    if (fewer) return [{ path: `${path}.grains`, message: 'More numbers in place give more marks than fewer.' }];
    return grains < most ? [] : [{ path: `${path}.grains`, message: 'A part mark is less than the value is worth.' }];
  });
}

/** Everything that is wrong with a scheme, each by its place; an empty list means that it can be locked. */
export function schemeProblems(stored: ItemScheme): SchemeProblem[] {
  const scheme = completeScheme(stored);
  const value = fromFractionText(stored.key.value);
  const most = valueGrains(scheme);
  const isNumeric = scheme.kind === 'numeric';
  const problems = [...(isNumeric ? [...keyProblems(stored.key, value), ...bandProblems(scheme.bands, value, most)] : []), ...methodProblems(scheme, most), ...shareProblems(scheme, Math.max(0, most)), ...partProblems(scheme, most)];
  if (!Number.isInteger(scheme.maxGrains) || scheme.maxGrains <= 0) problems.push({ path: 'maxGrains', message: 'An item is worth more than 0 marks.' });
  if (!isNumeric) return problems;
  const { downToDecimals, downToFigures = null } = scheme.roundings;
  if (downToFigures !== null && (scheme.key.figures === undefined || downToFigures < 1 || downToFigures > scheme.key.figures)) {
    problems.push({ path: 'roundings.downToFigures', message: 'Roundings have at most the figures of the key.' });
  }
  if (scheme.key.figures === undefined && downToDecimals !== null && (downToDecimals < 0 || downToDecimals >= scheme.key.decimals)) {
    problems.push({ path: 'roundings.downToDecimals', message: 'Roundings have fewer decimals than the key.' });
  }
  return problems;
}
