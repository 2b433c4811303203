import { fromFractionText, toDecimals, exactDecimals } from '../../shared/chemistry/exact';
import { work } from '../../shared/chemistry/work';
import { bandRange } from '../../shared/marking/bands';
import { GRAINS_PER_MARK, marksText } from '../../shared/marking/grains';
import type { ItemScheme } from '../../shared/marking/scheme';
import { roundingTexts } from './item-drafts';

interface Decided {
  readonly name: string;
  readonly words: string;
}

const policyWords = { ask: 'a lead decides', none: 'no marks' } as Readonly<Record<string, string>>;

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

/** What a scheme decides besides its key, line by line, for someone who answers for it. */
export function schemeInWords(scheme: ItemScheme): Decided[] {
  const worked = work(scheme.asked);
  const source = worked.ok ? `${worked.value.derivation.conventionName}, ${worked.value.derivation.source}` : scheme.asked.convention;
  const texts = roundingTexts(scheme);
  return [
    { name: 'Convention', words: source },
    { name: 'Roundings', words: texts.length === 0 ? 'only the key itself' : `${texts.join(' and ')}, in full${scheme.roundings.truncation ? ', cut off or rounded' : ''}` },
    { name: 'Alternatives', words: scheme.alternatives.length === 0 ? 'none' : scheme.alternatives.map(({ name, text, grains }) => `${name} ${text}, ${marksInWords(grains)}`).join('; ') },
    { name: 'Bands', words: bandsInWords(scheme) },
    { name: 'Named slips', words: (scheme.slips ?? []).length === 0 ? 'none' : (scheme.slips ?? []).map(({ letter, name, text, grains }) => `${letter}, ${name}, ${text}: ${marksInWords(grains)}`).join('; ') },
    { name: 'Crossed out', words: policyWords[scheme.crossedOut] ?? scheme.crossedOut },
    { name: 'Two answers', words: policyWords[scheme.twoAnswers] ?? scheme.twoAnswers },
  ];
}
