import { create } from 'xmlbuilder2';
import type { XMLBuilder } from 'xmlbuilder2/lib/interfaces';
import { ratio, toDecimals } from '../../shared/chemistry/exact';
import { GRAINS_PER_MARK } from '../../shared/marking/grains';
import { itemLabel } from '../../shared/marking/item-label';
import type { ItemScheme } from '../../shared/marking/scheme';
import type { QtiLeavesOut } from '../../shared/marking/qti-leaves-out';
import { carriedAttribute, type Carried } from './qti-carried';
import { claimsOf, type Claim } from './qti-claims';
import { declarePrinted, printedClaims, printedCondition, printedInteraction } from './qti-printed';

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
  const { printed } = scheme;
  const branches = printed
    ? printedClaims(scheme, printed).map((claim) => ({ grains: claim.grains, test: (branch: XMLBuilder) => printedCondition(branch, claim, scheme, printed) }))
    : claimsOf(scheme).map((claim) => ({ grains: claim.grains, test: (branch: XMLBuilder) => condition(branch, claim) }));
  branches.forEach(({ grains, test }, index) => {
    const branch = chain.ele(index === 0 ? 'qti-response-if' : 'qti-response-else-if');
    test(branch);
    score(branch, grains);
  });
  score(chain.ele('qti-response-else'), 0);
}

export interface PackedItem extends Carried {
  readonly identifier: string;
  readonly number: number;
  readonly prompt: string;
}

const leftOutWords: Readonly<Record<QtiLeavesOut, string>> = {
  'follow-through': 'marks for a value worked from the own answer to an earlier item',
  'method-marks': 'method marks, which a reader gives',
  'unit-cost': 'what a unit costs once a paper',
  'sign-cost': 'what a sign costs once a paper',
};

function declare(item: XMLBuilder, scheme: ItemScheme): void {
  const most = marksDecimal(scheme.maxGrains);
  if (scheme.printed) declarePrinted(item, scheme, scheme.printed);
  else item.ele('qti-response-declaration', { identifier: 'RESPONSE', cardinality: 'single', 'base-type': 'float' }).ele('qti-correct-response').ele('qti-value').txt(scheme.key.text);
  item.ele('qti-outcome-declaration', { identifier: 'SCORE', cardinality: 'single', 'base-type': 'float', 'normal-minimum': '0', 'normal-maximum': most });
  item.ele('qti-outcome-declaration', { identifier: 'MAXSCORE', cardinality: 'single', 'base-type': 'float' }).ele('qti-default-value').ele('qti-value').txt(most);
}

function interaction(body: XMLBuilder, { scheme, draft }: PackedItem): void {
  const carried = { [carriedAttribute]: JSON.stringify({ ...draft, prompt: draft.prompt === null ? null : '' }) };
  if (scheme.printed) {
    printedInteraction(body, scheme, scheme.printed, carried);
    return;
  }
  const [unit] = scheme.units;
  const answer = body.ele('p');
  answer.ele('qti-text-entry-interaction', { 'response-identifier': 'RESPONSE', 'expected-length': '12', ...carried });
  if (unit !== undefined) answer.txt(` ${unit}`);
}

/**
 * One item as a QTI 3.0 assessment item: a text entry, a choice or an order. A float has no trailing zeros, so places that were
 * written or left out decide nothing here: 6.1 and 6.10 are one number. What is left out stands in a comment.
 */
export function qtiItem(packed: PackedItem): string {
  const { identifier, number, prompt, scheme, leftOut } = packed;
  const document = create({ version: '1.0', encoding: 'UTF-8', invalidCharReplacement: '' });
  const item = document.ele(itemSpace, 'qti-assessment-item', {
    identifier,
    title: `${number}. ${itemLabel(scheme)}`,
    adaptive: 'false',
    'time-dependent': 'false',
    'xml:lang': 'en-GB',
  });
  item.att(instanceSpace, 'xsi:schemaLocation', `${itemSpace} ${itemSchema}`);
  if (leftOut.length > 0) item.com(` Left out: ${leftOut.map((part) => leftOutWords[part]).join('; ')}. `);
  declare(item, scheme);
  const body = item.ele('qti-item-body');
  body.ele('p').txt(prompt);
  interaction(body, packed);
  processing(item, scheme);
  return document.end({ prettyPrint: true });
}
