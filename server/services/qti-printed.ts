import type { XMLBuilder } from 'xmlbuilder2/lib/interfaces';
import { electronText } from '../../shared/chemistry/stem';
import type { ItemScheme, PrintedOptions } from '../../shared/marking/scheme';

export const optionName = (number: string | number): string => `option-${number}`;

/** What a choice or an order is scored by: exactly these numbers, or so many of the answer in their places. */
type PrintedClaim = { readonly grains: number } & ({ readonly numbers: readonly string[] } | { readonly inPlace: number });

/** All that pays, the best first and of equals in the order of the rules. Numbers that are no option cannot be given there. */
export function printedClaims({ alternatives, maxGrains }: ItemScheme, { answer, partMarks, options }: PrintedOptions): PrintedClaim[] {
  const length = answer.split(' ').length;
  const others = alternatives.map(({ text, grains }) => ({ grains, numbers: text.split(' ') }));
  const given = others.filter(({ numbers }) => numbers.length === length && new Set(numbers).size === length && numbers.every((number) => number !== '0' && Number(number) <= options.length));
  const claims: PrintedClaim[] = [{ grains: maxGrains, numbers: answer.split(' ') }, ...given, ...partMarks];
  return claims.filter(({ grains }) => grains > 0).sort((one, other) => other.grains - one.grains);
}

export function declarePrinted(item: XMLBuilder, { kind }: ItemScheme, { answer }: PrintedOptions): void {
  const declaration = item.ele('qti-response-declaration', { identifier: 'RESPONSE', cardinality: kind === 'order' ? 'ordered' : 'single', 'base-type': 'identifier' });
  const correct = declaration.ele('qti-correct-response');
  for (const number of answer.split(' ')) correct.ele('qti-value').txt(optionName(number));
}

export function printedInteraction(body: XMLBuilder, { kind }: ItemScheme, { options }: PrintedOptions, attributes: Record<string, string>): void {
  const shared = { 'response-identifier': 'RESPONSE', shuffle: 'false', ...attributes };
  const interaction = kind === 'order' ? body.ele('qti-order-interaction', shared) : body.ele('qti-choice-interaction', { ...shared, 'max-choices': '1' });
  options.forEach((option, index) => void interaction.ele('qti-simple-choice', { identifier: optionName(index + 1) }).txt(electronText(option)));
}

const identifier = (parent: XMLBuilder, number: string): void => void parent.ele('qti-base-value', { 'base-type': 'identifier' }).txt(optionName(number));

function sameNumbers(parent: XMLBuilder, numbers: readonly string[], isOrder: boolean): void {
  const match = parent.ele('qti-match');
  match.ele('qti-variable', { identifier: 'RESPONSE' });
  const wanted = isOrder ? match.ele('qti-ordered') : match;
  for (const number of numbers) identifier(wanted, number);
}

/** At least so many of the members of the response are those of the answer at their place. */
function inTheirPlaces(parent: XMLBuilder, answer: readonly string[], inPlace: number): void {
  const some = parent.ele('qti-any-n', { min: String(inPlace), max: String(answer.length) });
  answer.forEach((number, index) => {
    const match = some.ele('qti-match');
    match.ele('qti-index', { n: String(index + 1) }).ele('qti-variable', { identifier: 'RESPONSE' });
    identifier(match, number);
  });
}

export function printedCondition(parent: XMLBuilder, claim: PrintedClaim, { kind }: ItemScheme, { answer }: PrintedOptions): void {
  if ('numbers' in claim) sameNumbers(parent, claim.numbers, kind === 'order');
  else inTheirPlaces(parent, answer.split(' '), claim.inPlace);
}
