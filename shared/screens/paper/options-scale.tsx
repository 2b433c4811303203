import { useState } from 'react';
import { View } from 'react-native';
import Svg, { Circle, Path } from 'react-native-svg';
import type { ItemDraft, WorkedDraft } from '../../contracts/items';
import { SvgWords } from '../../ui/svg-words';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { line } from '../../ui/tokens';
import { useIsPhone } from '../../ui/use-breakpoint';
import { optionMarks } from './option-marks';
import { words } from './words';

const height = 112;
const base = 66;
const ring = 13;

/** The printed options on one line by their value: what is to be chosen or ordered, and how near the values lie. */
export function OptionsScale({ draft, worked }: { readonly draft: ItemDraft; readonly worked: WorkedDraft }) {
  const colors = useColors();
  const isPhone = useIsPhone();
  const [width, setWidth] = useState(0);
  const options = draft.printed?.options ?? [];
  const marks = optionMarks(worked.options.slice(0, options.length), width);
  const isRight = (number: number): boolean => draft.kind === 'choice' && worked.key?.text === String(number);
  return (
    <View style={{ minHeight: 120, gap: 8, justifyContent: 'center' }}>
      <View onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ height }} role="img" aria-label={`${words.options.inOrder}: ${marks.map(({ number, text }) => `${number}, ${text}`).join('; ')}`}>
        {width === 0 ? null : (
          <Svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} fill="none">
            <Path d={`M2,${base} H${width - 2}`} stroke={colors.ink} strokeWidth={line.scale} strokeLinecap="round" />
            {marks.map(({ number, text, x, labelX, row }) => {
              const right = isRight(number);
              const y = base - 22 - row * 28;
              return [
                <Path key={`${number}-stem`} d={`M${labelX},${y + ring} L${x},${base}`} stroke={right ? colors.copper : colors.rule} strokeWidth={1} />,
                <Path key={`${number}-mark`} d={`M${x},${base - 5} l5,5 l-5,5 l-5,-5 z`} fill={right ? colors.copper : colors.paper} stroke={right ? colors.copper : colors.ink2} strokeWidth={1.5} />,
                <Circle key={`${number}-ring`} cx={labelX} cy={y} r={ring} fill={colors.paper} stroke={right ? colors.copper : colors.ink2} strokeWidth={right ? 2 : 1.25} />,
                <SvgWords key={`${number}-number`} x={labelX} y={y + 4.5} anchor="middle" size={13} face="Next600" tone={right ? 'copper' : 'ink'}>
                  {String(number)}
                </SvgWords>,
                <SvgWords key={`${number}-value`} x={labelX} y={base + 22 + row * 16} anchor="middle" size={12} face="Mono400" tone={right ? 'copper' : 'ink3'}>
                  {text}
                </SvgWords>,
              ];
            })}
          </Svg>
        )}
      </View>
      <Text variant="small" tone={worked.key ? 'copper' : 'ink2'} weight={worked.key ? 600 : 400} style={isPhone ? { paddingHorizontal: 8, paddingBottom: 10 } : null}>
        {worked.key ? words.options.answerOf(worked.key.text) : words.options.noAnswer}
      </Text>
    </View>
  );
}
