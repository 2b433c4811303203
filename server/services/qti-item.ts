import { create } from 'xmlbuilder2';
import type { XMLBuilder } from 'xmlbuilder2/lib/interfaces';
import { ratio, toDecimals } from '../../shared/chemistry/exact';
import { GRAINS_PER_MARK } from '../../shared/marking/grains';
import { itemLabel } from '../../shared/marking/item-label';
import type { ItemScheme } from '../../shared/marking/scheme';
import { claimsOf, type Claim } from './qti-claims';

/** Namespace and schema of QTI 3.0 items, and those of its packages: 1EdTech, examples of QTI 3.0. */
const itemSpace = 'http://www.imsglobal.org/xsd/imsqtiasi_v3p0';
const itemSchema = 'https://purl.imsglobal.org/spec/qti/v3p0/schema/xsd/imsqti_asiv3p0p1_v1p0.xsd';
const instanceSpace = 'http://www.w3.org/2001/XMLSchema-instance';

/** Marks as a decimal; thirds of a mark to six places. */
export function marksDecimal(grains: number): string {
  const short = toDecimals(ratio(BigInt(grains), BigInt(GRAINS_PER_MARK)), 6);
  return short.replace(/\.?0+$/, '');
}

const baseValue = (parent: XMLBuilder, value: string): XMLBuilder => parent.ele('qti-base-value', { 'base-type': 'float' }).txt(value).up();

function equal(parent: XMLBuilder, value: string, attributes: Record<string, string>): void {
  const test = parent.ele('qti-equal', attributes);
  baseValue(test, value);
  test.ele('qti-variable', { identifier: 'RESPONSE' });
}

/** NOTE: the ends of a band count, and binary floats may miss them by a hair: they are named beside the tolerance. */
function condition(parent: XMLBuilder, claim: Claim): void {
  const any = parent.ele('qti-or');
  if (!('numbers' in claim)) equal(any, claim.key, { 'tolerance-mode': 'absolute', tolerance: `${claim.tolerance} ${claim.tolerance}` });
  for (const value of 'numbers' in claim ? claim.numbers : claim.ends) equal(any, value, { 'tolerance-mode': 'exact' });
}

const score = (parent: XMLBuilder, grains: number): void => void baseValue(parent.ele('qti-set-outcome-value', { identifier: 'SCORE' }), marksDecimal(grains));

function processing(item: XMLBuilder, scheme: ItemScheme): void {
  const chain = item.ele('qti-response-processing').ele('qti-response-condition');
  claimsOf(scheme).forEach((claim, index) => {
    const branch = chain.ele(index === 0 ? 'qti-response-if' : 'qti-response-else-if');
    condition(branch, claim);
    score(branch, claim.grains);
  });
  score(chain.ele('qti-response-else'), 0);
}

export interface PackedItem {
  readonly identifier: string;
  readonly number: number;
  readonly prompt: string;
  readonly scheme: ItemScheme;
}

/**
 * One numeric item as a QTI 3.0 assessment item with a text entry. A float has no trailing zeros, so places that were written
 * or left out decide nothing here: 6.1 and 6.10 are one number.
 */
export function qtiItem({ identifier, number, prompt, scheme }: PackedItem): string {
  const document = create({ version: '1.0', encoding: 'UTF-8', invalidCharReplacement: '' });
  const item = document.ele(itemSpace, 'qti-assessment-item', {
    identifier,
    title: `${number}. ${itemLabel(scheme)}`,
    adaptive: 'false',
    'time-dependent': 'false',
    'xml:lang': 'en-GB',
  });
  item.att(instanceSpace, 'xsi:schemaLocation', `${itemSpace} ${itemSchema}`);
  item.ele('qti-response-declaration', { identifier: 'RESPONSE', cardinality: 'single', 'base-type': 'float' }).ele('qti-correct-response').ele('qti-value').txt(scheme.key.text);
  item.ele('qti-outcome-declaration', { identifier: 'SCORE', cardinality: 'single', 'base-type': 'float', 'normal-minimum': '0', 'normal-maximum': marksDecimal(scheme.maxGrains) });
  item.ele('qti-outcome-declaration', { identifier: 'MAXSCORE', cardinality: 'single', 'base-type': 'float' }).ele('qti-default-value').ele('qti-value').txt(marksDecimal(scheme.maxGrains));
  const body = item.ele('qti-item-body');
  body.ele('p').txt(prompt);
  const [unit] = scheme.units;
  const answer = body.ele('p');
  answer.ele('qti-text-entry-interaction', { 'response-identifier': 'RESPONSE', 'expected-length': '12' });
  if (unit !== undefined) answer.txt(` ${unit}`);
  processing(item, scheme);
  return document.end({ prettyPrint: true });
}
