import { Text as SvgText, TSpan, type TextAnchor } from 'react-native-svg';
import { useColors } from './theme';
import { faces, symbolScale, type ColorRole } from './tokens';

export interface WordPart {
  readonly text: string;
  readonly isSymbol?: boolean | undefined;
}

/** Words of a drawing; a sigma in plain text is a symbol already. */
export type Words = string | readonly WordPart[];

export const partsOf = (words: Words): readonly WordPart[] =>
  typeof words === 'string'
    ? words
        .split(/(σ)/)
        .filter((text) => text !== '')
        .map((text) => ({ text, isSymbol: text === 'σ' }))
    : words;

export const plainOf = (words: Words): string => partsOf(words).map(({ text }) => text).join('');

interface SvgWordsProps {
  readonly children: Words;
  readonly x: number;
  readonly y: number;
  readonly anchor?: TextAnchor | undefined;
  readonly face?: keyof typeof faces | undefined;
  readonly size?: number | undefined;
  readonly tone?: ColorRole | undefined;
  /** A halo of this colour, where lines pass behind. */
  readonly halo?: ColorRole | undefined;
}

/** Text in a drawing, its symbols in STIX. */
export function SvgWords({ children, x, y, anchor = 'start', face = 'Next500', size = 13, tone = 'ink2', halo }: SvgWordsProps) {
  const colors = useColors();
  const around = halo === undefined ? {} : { stroke: colors[halo], strokeWidth: 5, strokeLinejoin: 'round' as const, paintOrder: 'stroke' };
  return (
    <SvgText x={x} y={y} textAnchor={anchor} fontFamily={faces[face]} fontSize={size} fill={colors[tone]} {...around}>
      {partsOf(children).map(({ text, isSymbol }, index) =>
        isSymbol ? (
          <TSpan key={index} fontFamily={faces.Stix} fontSize={size * symbolScale}>
            {text}
          </TSpan>
        ) : (
          text
        ),
      )}
    </SvgText>
  );
}
