import { convert } from 'xmlbuilder2';

/** An element of a parsed file: attributes under `@`, what is in it in order under `#`. */
export type Element = Readonly<Record<string, unknown>>;

const listOf = (value: unknown): Element[] => (value === undefined ? [] : Array.isArray(value) ? (value as Element[]) : [value as Element]);

/** The elements of a name below an element, in order, at any depth. */
export function under(element: unknown, name: string): Element[] {
  if (typeof element !== 'object' || element === null) return [];
  return Object.entries(element).flatMap(([key, value]) => (key === name ? listOf(value) : Array.isArray(value) ? value.flatMap((one) => under(one, name)) : under(value, name)));
}

export const parsed = (xml: string): Element => convert(xml, { format: 'object' }) as unknown as Element;

export const first = (element: unknown, name: string): Element => {
  const [found] = under(element, name);
  if (!found) throw new Error(`No ${name} here.`);
  return found;
};

const numberIn = (element: unknown): number => Number((first(element, 'qti-base-value') as { '#': string })['#']);

/** qti-equal, from memory of the information model: exact is the same float; absolute is from x - t0 to x + t1, ends included. */
function isEqual(test: Element, response: number): boolean {
  const x = numberIn(test);
  if (test['@tolerance-mode'] === 'exact') return x === response;
  const [below = 0, above = below] = String(test['@tolerance']).split(' ').map(Number);
  return response >= x - below && response <= x + above;
}

/** The SCORE that the response processing of an item gives a number: the first branch that holds. */
export function qtiScore(xml: string, response: number): number {
  const chain = first(parsed(xml), 'qti-response-condition');
  for (const branch of [...under(chain, 'qti-response-if'), ...under(chain, 'qti-response-else-if')]) {
    if (under(branch, 'qti-equal').some((test) => isEqual(test, response))) return numberIn(first(branch, 'qti-set-outcome-value'));
  }
  return numberIn(first(chain, 'qti-response-else'));
}

const identifiersIn = (element: unknown): string[] => under(element, 'qti-base-value').map((value) => (value as { '#': string })['#']);

const sameList = (one: readonly string[], other: readonly string[]): boolean => one.length === other.length && one.every((name, index) => name === other[index]);

/** qti-any-n, qti-index and qti-match of a choice or an order, from memory: at least `min` of the members match; else the same list. */
function holds(branch: Element, response: readonly string[]): boolean {
  const [some] = under(branch, 'qti-any-n');
  if (!some) return sameList(identifiersIn(first(branch, 'qti-match')), response);
  const met = under(some, 'qti-match').filter((match) => response[Number(first(match, 'qti-index')['@n']) - 1] === identifiersIn(match)[0]).length;
  return met >= Number(some['@min']) && met <= Number(some['@max']);
}

/** The same for identifiers, in the order given. */
export function qtiScoreOf(xml: string, response: readonly string[]): number {
  const chain = first(parsed(xml), 'qti-response-condition');
  for (const branch of [...under(chain, 'qti-response-if'), ...under(chain, 'qti-response-else-if')]) {
    const { 'qti-set-outcome-value': set, ...test } = branch;
    if (holds(test, response)) return numberIn(set);
  }
  return numberIn(first(chain, 'qti-response-else'));
}
