import { marksText } from './grains';
import type { KeyingStep } from './keying';
import type { Code, RuleName } from './scheme';

export interface Reason {
  /** A few words, for a column: `the key, rounded`. */
  readonly head: string;
  /** A sentence with the numbers. */
  readonly detail: string;
}

interface StoredVerdict {
  readonly grains: number | null;
  readonly rule: RuleName;
  readonly numbers: Readonly<Record<string, string>>;
}

const codeReasons: Record<Code, Reason> = {
  blank: { head: 'nothing written', detail: 'The box is blank: 0 marks.' },
  'cannot-read': { head: 'can’t be read', detail: 'A person has to decide what an unreadable answer is worth.' },
  'crossed-out': { head: 'crossed out', detail: 'The answer is crossed out, with nothing in its place.' },
  'two-answers': { head: 'two answers', detail: 'Two answers were left standing.' },
  elsewhere: { head: 'written elsewhere', detail: 'The answer stands in another place.' },
  'wrong-page': { head: 'wrong page', detail: 'The page does not belong to this answer.' },
  'ask-the-lead': { head: 'set aside', detail: 'A reader asked the lead to look.' },
};

const places = (count: string): string => (count === '1' ? 'one decimal' : count === '0' ? 'a whole number' : `${count} decimals`);

/** 0.08 high, 0.08 low: how far from the key, and on which side. */
function apart(distance: string): string {
  return distance.startsWith('-') ? `${distance.slice(1)} low` : `${distance} high`;
}

const stepWords: Record<KeyingStep, string> = {
  'point-missing': 'point missing',
  'point-moved': 'point moved',
  'digits-exchanged': 'two digits exchanged',
  'digit-doubled': 'a digit doubled',
  'digit-dropped': 'a digit dropped',
  'look-alike': 'a look-alike digit',
  'sign-lost': 'sign lost',
};

const isNothing = (cost: string): boolean => cost === '0';
const lessBy = (cost: string): string => (isNothing(cost) ? 'paid for earlier on this paper' : `less ${marksText(Number(cost))}, once a paper`);

/** What came on top of the rule, or off it. */
function besides({ sign, signCost = '0', unit, unitWanted, unitCost = '0', method, methodGrains = '0' }: StoredVerdict['numbers']): Reason[] {
  return [
    ...(sign === undefined ? [] : [{ head: 'sign reversed', detail: `The sign is reversed: ${lessBy(signCost)}.` }]),
    ...(unitWanted === undefined ? [] : [{ head: unit ? `unit ${unit}` : 'no unit', detail: `The unit is ${unitWanted}, and ${unit ? `${unit} is given` : 'none is given'}: ${lessBy(unitCost)}.` }]),
    ...(method === undefined ? [] : [{ head: 'method', detail: `From the working, ${marksText(Number(methodGrains))} for: ${method}.` }]),
  ];
}

/** Puts a stored verdict into words for staff: the rule that was met first, with its numbers, then what came on top or off. */
export function reasonInWords(verdict: StoredVerdict): Reason {
  const [first, ...rest] = [ruleInWords(verdict), ...besides(verdict.numbers)];
  return { head: [first, ...rest].map(({ head }) => head).join(', '), detail: [first, ...rest].map(({ detail }) => detail).join(' ') };
}

function ruleInWords({ grains, rule, numbers }: StoredVerdict): Reason {
  const { key = '', distance = '0', decimals = '0' } = numbers;
  switch (rule) {
    case 'code':
      return grains === 0 && numbers.code !== 'blank'
        ? { head: codeReasons[numbers.code as Code].head, detail: `${codeReasons[numbers.code as Code].detail} The scheme gives 0 marks for that.` }
        : codeReasons[numbers.code as Code];
    case 'key':
      return { head: 'the key', detail: `It is the key, ${key}.` };
    case 'rounding':
      return { head: 'the key, rounded', detail: `It is the key, ${key}, given to ${places(decimals)}.` };
    case 'alternative':
      return { head: `accepted, ${numbers.name ?? ''}`, detail: `It is ${numbers.alternative ?? ''}, accepted as ${numbers.name ?? ''}.` };
    case 'band':
      return { head: `in the band ${numbers.band ?? ''}`, detail: `It lies in ${numbers.from ?? ''} to ${numbers.to ?? ''}, ${apart(distance)}.` };
    case 'follow-through':
      return { head: `follows from own ${numbers.followed ?? ''}`, detail: `Worked on from the candidate’s own ${numbers.followed ?? ''}, the value is ${numbers.carried ?? ''}${numbers.band ? `, and it lies in ${numbers.from ?? ''} to ${numbers.to ?? ''}` : ''}. One error costs once.` };
    case 'part':
      return { head: `${numbers.inPlace ?? ''} of ${numbers.of ?? ''} in place`, detail: `Of the order ${key}, ${numbers.inPlace ?? ''} of ${numbers.of ?? ''} numbers stand in their places.` };
    case 'withdrawn':
      return numbers.withdrawn === 'full' ? { head: 'withdrawn, full marks', detail: 'The item was withdrawn: everyone has its marks.' } : { head: 'withdrawn', detail: 'The item was withdrawn: it is out of the total.' };
    case 'slip':
      return { head: `fits ${numbers.letters ?? ''}, ${numbers.slips ?? ''}`, detail: `It is ${numbers.slip ?? ''}, what ${numbers.slips ?? ''} comes to. A slip is an explanation, not proof.` };
    case 'nothing':
      if (numbers.inPlace !== undefined) return { head: numbers.of === '1' ? 'another number' : `${numbers.inPlace} of ${numbers.of ?? ''} in place`, detail: `No rule is met: the answer is ${key}.` };
      if (numbers.slips) return { head: `fits ${numbers.letters ?? ''}, ${numbers.slips}`, detail: `No rule is met: ${apart(distance)} beside the key, ${key}. It fits ${numbers.slips}, which has no share here.` };
      if (numbers.step) return { head: `one step from the key, ${stepWords[numbers.step as KeyingStep]}`, detail: `No rule is met: ${apart(distance)} beside the key, ${key}. It may be a typing error: ${stepWords[numbers.step as KeyingStep]}. Look at the crop.` };
      return { head: /^-?0(\.0+)?$/.test(distance) ? 'too few decimals' : `nothing fits, ${apart(distance)}`, detail: nothingDetail(key, distance) };
  }
}

const nothingDetail = (key: string, distance: string): string =>
  /^-?0(\.0+)?$/.test(distance)
    ? `The value is that of the key, ${key}, but with fewer decimals than are accepted.`
    : `No rule is met: ${apart(distance)} beside the key, ${key}.`;
