import { useState } from 'react';
import { View } from 'react-native';
import Svg, { G, Path } from 'react-native-svg';
import { frameOf, nameLine, type ScaleFrame } from './scale-frame';
import { graduationsOf } from './scale-geometry';
import { Bands, KeyMarks, Levels, SlipMarks } from './scale-key';
import { spokenScale, type ScaleProps } from './scale-props';
import { Drop, Hanging, PairReadings } from './scale-readings';
import { SvgWords } from './svg-words';
import { useColors } from './theme';

export type { ScaleProps, ScaleSlip } from './scale-props';

/** Graduations below, above them what the key pays, height is marks; below the line hang the readings. */
export function Scale(props: ScaleProps) {
  const [width, setWidth] = useState(0);
  const frame = frameOf(props, width);
  return (
    <View role="img" aria-label={spokenScale(props)} onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ minHeight: frame.height, alignSelf: 'stretch' }} testID="scale">
      {width === 0 ? null : (
        <Svg width={width} height={frame.height} viewBox={`0 0 ${width} ${frame.height}`} fill="none" aria-hidden>
          <Graduations scale={props} frame={frame} />
          {props.fit === 'editor' ? <Levels of={props.of} frame={frame} /> : null}
          <Bands scale={props} frame={frame} />
          <SlipMarks frame={frame} nameY={(row) => nameLine(frame, row)} />
          <KeyMarks scale={props} frame={frame} />
          <Line frame={frame} />
          <Hanging scale={props} frame={frame} />
          {props.pair ? <PairReadings pair={props.pair} frame={frame} /> : null}
          <Drop scale={props} frame={frame} />
        </Svg>
      )}
    </View>
  );
}

function Line({ frame: { pad, base, width } }: { frame: ScaleFrame }) {
  const colors = useColors();
  return <Path d={`M${pad - 8},${base} H${width - pad + 8}`} stroke={colors.ink} strokeWidth={1.75} strokeLinecap="round" />;
}

/** Of Mono at 12. */
const numeralWidth = 7.4;

function Graduations({ scale, frame }: { scale: ScaleProps; frame: ScaleFrame }) {
  const colors = useColors();
  const { place, full, base, numerals, width } = frame;
  return graduationsOf(scale).map(({ at, isMajor }) => {
    const x = place(at);
    const numeral = at.toFixed(scale.decimals);
    // The outermost stay whole at the edges.
    const half = (numeral.length * numeralWidth) / 2;
    if (!isMajor) return <Path key={at} d={`M${x},${base} V${base + 5}`} stroke={colors.rule} />;
    return (
      <G key={at}>
        <Path d={`M${x},${full - 6} V${base}`} stroke={colors.hair} />
        <Path d={`M${x},${base} V${base + 11}`} stroke={colors.ink2} strokeWidth={1.25} />
        <Path d={`M${x},${base + 11} V${numerals - 13}`} stroke={colors.hair} />
        <SvgWords x={Math.min(Math.max(x, half), width - half)} y={numerals} anchor="middle" face="Mono400" size={12} tone="ink3">
          {numeral}
        </SvgWords>
      </G>
    );
  });
}
