import { fromFractionText, toDecimals, exactDecimals } from '../../shared/chemistry/exact';
import { computedConventions } from '../../shared/chemistry/conventions';
import { bandRange } from '../../shared/marking/bands';
import { GRAINS_PER_MARK, marksText } from '../../shared/marking/grains';
import { completeScheme } from '../../shared/marking/complete-scheme';
import { electronLabel } from '../../shared/marking/item-label';
import type { CompleteScheme, ItemScheme } from '../../shared/marking/scheme';
import { guardOf } from '../../shared/marking/watch/guard';
import { silentSlips } from '../../shared/marking/watch/silent';
import { toldApart } from '../../shared/marking/watch/told-apart';
import { watchWords } from '../../shared/marking/watch/words';
import { optionValues, roundingTexts } from './drafts/work-draft';

interface Decided {
  readonly name: string;
  readonly words: string;
}

const policyWords = { ask: 'a lead decides', none: 'no marks', last: 'the last one standing counts' } as Readonly<Record<string, string>>;

const marksInWords = (grains: number): string => `${marksText(grains)} ${grains === GRAINS_PER_MARK ? 'mark' : 'marks'}`;

function bandsInWords({ bands, key }: ItemScheme): string {
  if (bands.length === 0) return 'none';
  const value = fromFractionText(key.value);
  return bands
    .map((band) => {
      const { from, to } = bandRange(band, value);
      const places = Math.max(key.decimals, exactDecimals(from) ?? 4);
      return `${band.name}: ${toDecimals(from, places)} to ${toDecimals(to, places)}, ${marksInWords(band.grains)}`;
    })
    .join('; ');
}

const policiesInWords = (scheme: ItemScheme): Decided[] => [
  { name: 'Crossed out', words: policyWords[scheme.crossedOut] ?? scheme.crossedOut },
  { name: 'Two answers', words: policyWords[scheme.twoAnswers] ?? scheme.twoAnswers },
];

function sourceInWords({ asked }: ItemScheme): string {
  if (asked.typed) return `typed by the lead, not checked by the server: ${asked.typed.source}`;
  const convention = asked.convention === 'typed' ? null : computedConventions[asked.convention];
  return convention ? `${convention.name}, ${convention.source}` : asked.convention;
}

/** The parts that not every scheme has: a line each where it has them. */
function laterInWords(scheme: CompleteScheme, numberOf: (itemId: string) => number | null): Decided[] {
  const { printed, followThrough: link, methodMarks, unitRule, signRule, units } = scheme;
  const sources = link ? [link.from, ...(link.second ? [link.second.from] : [])].map((id) => `item ${numberOf(id) ?? ''}`).join(' and ') : '';
  const values = optionValues(scheme);
  return [
    ...(printed ? [{ name: 'Options', words: printed.options.map((option, index) => `${index + 1}: ${electronLabel(option)}${option.configuration?.trim() ? ` (${option.configuration.trim()})` : ''}, ${values[index] ?? ''}`).join('; ') }] : []),
    ...(printed && printed.partMarks.length > 0 ? [{ name: 'Part marks', words: printed.partMarks.map(({ inPlace, grains }) => `${inPlace} in place, ${marksInWords(grains)}`).join('; ') }] : []),
    ...(link ? [{ name: 'Follows from', words: link.isTrivial ? `${sources}, a step too short to be carried on` : `the own value of ${sources}, one error costs once` }] : []),
    ...(methodMarks.length > 0 ? [{ name: 'Method marks', words: methodMarks.map(({ text, grains }) => `${text}, ${marksInWords(grains)}`).join('; ') }] : []),
    ...(unitRule ? [{ name: 'Unit', words: `${units[0] ?? ''}; missing or another costs ${marksInWords(unitRule.grains)}, once a paper` }] : []),
    ...(signRule ? [{ name: 'Sign', words: `reversed costs ${marksInWords(signRule.grains)}, once a paper` }] : []),
  ];
}

const capital = (sentence: string): string => sentence.charAt(0).toUpperCase() + sentence.slice(1);

/** What the rules pay or cannot see besides what they are meant for: a line each where there is something to say. */
function watchInWords(scheme: ItemScheme): Decided[] {
  const paid = guardOf(scheme).flatMap(({ pays }) => pays.map((value) => watchWords.paid({ ...value, marks: marksText(value.grains) })));
  const untold = toldApart(scheme);
  const groups = [...new Set(untold.map(({ rounded }) => rounded))].map((rounded) => untold.filter((slip) => slip.rounded === rounded));
  const silent = silentSlips(scheme).rightNumber.map(({ name }) => name);
  return [
    ...(paid.length > 0 ? [{ name: 'Tolerance guard', words: `${capital(paid.join('; '))}.` }] : []),
    ...(untold.length > 0 ? [{ name: 'Not told apart', words: groups.flatMap(([first, ...rest]) => (first ? [watchWords.notToldApart([first, ...rest], first.rounded, first.decimals)] : [])).join(' ') }] : []),
    ...(silent.length > 0 ? [{ name: 'Silent slips', words: capital(watchWords.silent(silent, scheme.key.text)) }] : []),
  ];
}

/** What a scheme decides besides its key, line by line, for someone who answers for it. */
export function schemeInWords(stored: ItemScheme, numberOf: (itemId: string) => number | null): Decided[] {
  const scheme = completeScheme(stored);
  const source = sourceInWords(scheme);
  if (scheme.kind !== 'numeric') {
    return [
      { name: 'Convention', words: source },
      ...laterInWords(scheme, numberOf),
      { name: 'Alternatives', words: scheme.alternatives.length === 0 ? 'none' : scheme.alternatives.map(({ name, text, grains }) => `${name} ${text}, ${marksInWords(grains)}`).join('; ') },
      ...policiesInWords(scheme),
    ];
  }
  const texts = roundingTexts(stored);
  return [
    { name: 'Convention', words: source },
    { name: 'Roundings', words: texts.length === 0 ? 'only the key itself' : `${texts.join(' and ')}, in full${scheme.roundings.truncation ? ', cut off or rounded' : ''}` },
    { name: 'Alternatives', words: scheme.alternatives.length === 0 ? 'none' : scheme.alternatives.map(({ name, text, grains }) => `${name} ${text}, ${marksInWords(grains)}`).join('; ') },
    { name: 'Bands', words: bandsInWords(scheme) },
    { name: 'Named slips', words: scheme.slips.length === 0 ? 'none' : scheme.slips.map(({ letter, name, text, grains }) => `${letter}, ${name}, ${text}: ${marksInWords(grains)}`).join('; ') },
    ...watchInWords(stored),
    ...laterInWords(scheme, numberOf),
    ...policiesInWords(scheme),
  ];
}
