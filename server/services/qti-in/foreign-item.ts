import { compare, equals, toFractionText, whole, zero, type Exact } from '../../../shared/chemistry/exact';
import type { ItemDraft } from '../../../shared/contracts/items';
import { readAnswer, type ReadValue } from '../../../shared/marking/read-answer';
import { readMarks } from '../../../shared/marking/typed-marks';
import { ItemRefusal } from './refusal';
import { bodyText } from './body-text';
import { below, elementsOf, textOf, type XmlElement } from './read-xml';

const refuse = (message: string): never => {
  throw new ItemRefusal(message);
};

function only(element: XmlElement, name: string, message: string): XmlElement {
  const found = below(element, name);
  const [one] = found;
  return one && found.length === 1 ? one : refuse(message);
}

/** A number as XML has it; its trailing zeros say nothing there, for a float has none. */
function numberOf(text: string, what: string): ReadValue & { readonly text: string } {
  const plain = text.trim();
  const short = /^[+-]?\d+\.\d*0+$/.test(plain) ? plain.replace(/\.?0+$/, '') : plain;
  const read = /^[+-]?\d+(\.\d+)?([eE][+-]?\d{1,2})?$/.test(short) ? readAnswer(short.replace(/^\+/, ''), []) : null;
  if (!read?.ok) return refuse(`${what} “${plain.slice(0, 20)}” is no number.`);
  return { ...read, text: short.replace(/^\+/, '') };
}

interface Tolerance {
  readonly kind: 'absolute' | 'relative';
  readonly width: string;
}

/** `tolerance` has one width for both sides, or one each; a relative one is a percentage. From memory of the information model. */
function toleranceOf({ attributes }: XmlElement): Tolerance | null {
  const mode = attributes['tolerance-mode'];
  if (mode === undefined || mode === 'exact') return null;
  if (mode !== 'absolute' && mode !== 'relative') return refuse(`The tolerance mode “${mode}” is not known.`);
  if (attributes['include-lower-bound'] === 'false' || attributes['include-upper-bound'] === 'false') refuse('Its tolerance leaves out its ends; here they count.');
  const [lower = '', upper = lower, ...more] = (attributes['tolerance'] ?? '').trim().split(/\s+/);
  const [from, to] = [numberOf(lower, 'The tolerance'), numberOf(upper, 'The tolerance')];
  if (more.length > 0 || !equals(from.value, to.value)) refuse('Its tolerance is not the same on both sides.');
  if (compare(from.value, zero) < 0) refuse('Its tolerance is less than nothing.');
  return equals(from.value, zero) ? null : { kind: mode, width: from.text };
}

/** Whether an expression is the key: the declared one, or its number. */
function isKey(expression: XmlElement, key: Exact): boolean {
  if (expression.name === 'qti-correct') return expression.attributes['identifier'] === 'RESPONSE';
  return expression.name === 'qti-base-value' && equals(numberOf(textOf(expression), 'The value compared').value, key);
}

const isResponse = ({ name, attributes }: XmlElement): boolean => name === 'qti-variable' && attributes['identifier'] === 'RESPONSE';

function testOf(branch: XmlElement, key: Exact): { readonly tolerance: Tolerance | null; readonly set: XmlElement } {
  const [test, set, ...more] = elementsOf(branch);
  if (!test || !set || more.length > 0 || !['qti-equal', 'qti-match'].includes(test.name) || set.name !== 'qti-set-outcome-value' || set.attributes['identifier'] !== 'SCORE') refuse('Its scoring is more than one comparison with the key.');
  const [one, other, ...rest] = elementsOf(test as XmlElement);
  const isCompared = one && other && rest.length === 0 && ((isResponse(one) && isKey(other, key)) || (isResponse(other) && isKey(one, key)));
  if (!isCompared) refuse('Its scoring does not compare the answer with the key.');
  return { tolerance: test?.name === 'qti-equal' ? toleranceOf(test) : null, set: set as XmlElement };
}

/** What a branch sets SCORE to: a number, or null for the declared maximum. */
function scoreSet(set: XmlElement): Exact | null {
  const [value, ...rest] = elementsOf(set);
  if (value && rest.length === 0 && value.name === 'qti-base-value') return numberOf(textOf(value), 'The mark').value;
  if (value && rest.length === 0 && value.name === 'qti-variable' && value.attributes['identifier'] === 'MAXSCORE') return null;
  return refuse('Its scoring gives something other than a number of marks.');
}

interface Scoring {
  readonly tolerance: Tolerance | null;
  readonly score: Exact | null;
}

function scoringOf(item: XmlElement, key: Exact): Scoring {
  const processing = only(item, 'qti-response-processing', 'It has no response processing.');
  const template = processing.attributes['template'];
  const parts = elementsOf(processing);
  if (template !== undefined && parts.length === 0) return /\/match_correct(\.xml)?$/.test(template) ? { tolerance: null, score: null } : refuse('Its scoring is a template other than match_correct.');
  const [chain, ...rest] = parts;
  if (!chain || chain.name !== 'qti-response-condition' || rest.length > 0) return refuse('Its scoring is more than one condition.');
  const [first, last, ...more] = elementsOf(chain);
  if (!first || first.name !== 'qti-response-if' || more.length > 0 || (last && last.name !== 'qti-response-else')) return refuse('Its scoring is more than one comparison with the key.');
  if (last) {
    const [set, ...others] = elementsOf(last);
    const isNothing = set?.name === 'qti-set-outcome-value' && set.attributes['identifier'] === 'SCORE' && others.length === 0 && equals(scoreSet(set) ?? whole(1), zero);
    if (!isNothing) refuse('Its scoring gives marks to other answers.');
  }
  const { tolerance, set } = testOf(first, key);
  return { tolerance, score: scoreSet(set) };
}

/** Of MAXSCORE, the normal maximum of SCORE, or what its scoring gives. */
function marksOf(item: XmlElement, score: Exact | null, isTemplate: boolean): string {
  const outcomes = below(item, 'qti-outcome-declaration');
  const named = (identifier: string) => outcomes.find(({ attributes }) => attributes['identifier'] === identifier);
  const maximum = named('MAXSCORE');
  const most = maximum ? below(maximum, 'qti-value').map(textOf)[0] : undefined;
  const declared = most ?? named('SCORE')?.attributes['normal-maximum'];
  const marks = declared === undefined ? score ?? (isTemplate ? whole(1) : null) : numberOf(declared, 'The most marks').value;
  if (marks === null) return refuse('It does not say what it is worth.');
  if (score !== null && !equals(score, marks)) return refuse('Its key does not give all its marks.');
  const text = toFractionText(marks);
  const read = readMarks(text);
  return read.ok ? text : refuse(read.message);
}

/** A text entry with one number for its key, from elsewhere, as an item whose key is typed. Throws ItemRefusal. */
export function foreignItem(item: XmlElement, identifier: string): ItemDraft {
  const body = only(item, 'qti-item-body', 'It has no body.');
  const { prompt, interactions } = bodyText(body);
  const [interaction] = interactions;
  if (!interaction || interactions.length > 1 || interaction.name !== 'qti-text-entry-interaction') return refuse(interactions.length > 1 ? 'It asks for more than one answer.' : `It asks by ${interaction?.name ?? 'nothing'}; only a text entry is read.`);
  const declaration = only(item, 'qti-response-declaration', 'It declares more or less than one answer.');
  const { identifier: response, cardinality, 'base-type': type } = declaration.attributes;
  if (response !== 'RESPONSE' || interaction.attributes['response-identifier'] !== 'RESPONSE') return refuse('Its answer is not called RESPONSE.');
  if (cardinality !== 'single' || (type !== 'float' && type !== 'integer')) return refuse('Its answer is no single number.');
  if (below(declaration, 'qti-mapping').length > 0) return refuse('Its scoring is a mapping.');
  const key = numberOf(textOf(only(declaration, 'qti-value', 'It has more or less than one key.')), 'The key');
  const { tolerance, score } = scoringOf(item, key.value);
  const marks = marksOf(item, score, below(item, 'qti-response-processing')[0]?.attributes['template'] !== undefined);
  if (prompt === '') return refuse('Its body has no words.');
  if (prompt.length > 600) return refuse('Its question is longer than 600 characters.');
  const label = (item.attributes['title'] ?? '').trim().slice(0, 60) || identifier.slice(0, 60);
  return {
    kind: 'numeric',
    asked: { symbol: '', charge: 0, electron: '', quantity: 'value', convention: 'typed', typed: { label, value: key.text, unit: '', source: `QTI item ${identifier}` } },
    printed: null,
    decimals: Math.min(4, key.decimals),
    figures: 4,
    prompt,
    marks,
    roundings: { downToDecimals: null, truncation: false },
    bands: tolerance ? [{ name: 'within tolerance', ...tolerance, marks }] : [],
    alternatives: [],
    slips: [],
    followThrough: null,
    methodMarks: [],
    unitCost: null,
    signCost: null,
    crossedOut: 'ask',
    twoAnswers: 'ask',
  };
}

