import { marksText } from './grains';
import type { RuleName, Verdict } from './scheme';

export interface Telling {
  readonly verdict: Verdict;
  readonly maxGrains: number;
  /** Of the slips that the value fits, the likeliest first. */
  readonly feedback: readonly string[];
  /** Whether the key may be told. */
  readonly showsKey: boolean;
}

type Numbers = Verdict['numbers'];

const decimalsOf = (count: string | undefined): string => (count === '0' ? 'a whole number' : count === '1' ? 'one decimal' : `${count ?? ''} decimals`);

const keyOf = ({ key }: Numbers, showsKey: boolean): string => (showsKey && key ? ` The value is ${key}.` : '');

const sentences: Readonly<Record<RuleName, (numbers: Numbers, telling: Telling) => string>> = {
  withdrawn: ({ withdrawn }) => (withdrawn === 'full' ? 'This question was withdrawn, and everyone has its marks.' : 'This question was withdrawn and does not count.'),
  code: ({ code }) => (code === 'blank' ? 'Nothing stands in the box.' : 'No single answer stands in the box.'),
  key: () => 'Your answer is right.',
  rounding: ({ decimals }) => `Your answer is right, given to ${decimalsOf(decimals)}.`,
  alternative: ({ name }) => `Your answer is accepted: ${name ?? ''}.`,
  band: ({ from, to }, { showsKey }) => (showsKey ? `Your answer lies between ${from ?? ''} and ${to ?? ''}, which is accepted.` : 'Your answer is near enough to be accepted.'),
  'follow-through': ({ followed }) => `Your answer follows rightly from your own value of an earlier question, ${followed ?? ''}. An error costs once.`,
  part: ({ inPlace, of }) => `${inPlace ?? ''} of the ${of ?? ''} numbers stand in their places.`,
  slip: (numbers, { feedback, showsKey }) => `${feedback[0] ?? 'Your answer fits a known slip.'}${keyOf(numbers, showsKey)}`,
  nothing: (numbers, { feedback, showsKey }) => `${feedback[0] === undefined ? 'Your answer is another value.' : `Your answer may have come about so. ${feedback[0]}`}${keyOf(numbers, showsKey)}`,
};

function besides({ sign, signCost = '0', unitWanted, unitCost = '0', method, methodGrains = '0' }: Numbers): string[] {
  const cost = (grains: string): string => (grains === '0' ? 'which costs nothing more here' : `which costs ${marksText(Number(grains))}, once`);
  return [
    ...(sign === undefined ? [] : [`The sign is the wrong way round, ${cost(signCost)}.`]),
    ...(unitWanted === undefined ? [] : [`The unit should be ${unitWanted}, ${cost(unitCost)}.`]),
    ...(method === undefined ? [] : [`Your working earns ${marksText(Number(methodGrains))}: ${method}.`]),
  ];
}

/**
 * What a candidate is told of a mark: the mark, then the reason. Ours, no source; a slip is an explanation, never proof.
 * A blank of three marks: "0 of 3. Nothing stands in the box."
 */
export function toldToCandidate(telling: Telling): string {
  const { verdict: { grains, rule, numbers }, maxGrains } = telling;
  const mark = grains === null ? 'A person decides this mark.' : `${marksText(grains)} of ${marksText(maxGrains)}.`;
  return [mark, sentences[rule](numbers, telling), ...besides(numbers)].join(' ');
}
