import { useState } from 'react';
import { View } from 'react-native';
import Svg, { G, Path, Rect, Text as SvgText } from 'react-native-svg';
import { graduationsOf, outlineOf, placesOn, stepsOf, type ScaleBand } from './scale-geometry';
import { useColors } from './theme';
import { faces } from './tokens';

interface ScaleMark {
  readonly at: number;
  readonly label: string;
}

export interface ScaleProps {
  /** phone: 13 a mark; wide: 19; editor: 34, with the levels of the marks. */
  readonly fit: 'phone' | 'wide' | 'editor';
  readonly lo: number;
  readonly hi: number;
  readonly major: number;
  readonly minor: number;
  readonly decimals: number;
  /** Marks of the item. */
  readonly of: number;
  readonly keyAt: number;
  /** Such as `key 6.10, rounded 6.1`. */
  readonly keyText: string;
  readonly roundings?: readonly ScaleMark[];
  readonly alternatives?: readonly (ScaleMark & { readonly marks: number })[];
  readonly bands?: readonly ScaleBand[];
  /** The value being typed. */
  readonly drop?: number | null;
  readonly dropText?: string;
}

const fits = { phone: { perMark: 13, pad: 14 }, wide: { perMark: 19, pad: 14 }, editor: { perMark: 34, pad: 40 } } as const;
const tallest = 128;
const under = 34;

/** In words, for those who do not see the drawing. */
function spoken({ keyText, of, bands = [], roundings = [], alternatives = [], drop, dropText }: ScaleProps): string {
  const marks = (count: number) => `${Number(count.toFixed(2))} ${count === 1 ? 'mark' : 'marks'}`;
  return [
    `${keyText}, ${marks(of)}`,
    ...roundings.map(({ label }) => `accepted rounding ${label}`),
    ...alternatives.map(({ label, marks: given }) => `accepted ${label}, ${marks(given)}`),
    ...bands.map(({ name, from, to, marks: given }) => `band ${name}, ${Number(from.toFixed(6))} to ${Number(to.toFixed(6))}, ${marks(given)}`),
    ...(drop === null || drop === undefined ? [] : [`value ${dropText ?? drop}`]),
  ].join('. ');
}

/** Graduations below, above them what the key pays, height is marks; a drop for the value in hand. */
export function Scale(props: ScaleProps) {
  const { fit, lo, hi, of, keyAt, keyText, decimals, roundings = [], alternatives = [], bands = [], drop = null } = props;
  const colors = useColors();
  const [width, setWidth] = useState(0);
  const { perMark: wanted, pad } = fits[fit];
  const perMark = Math.min(wanted, tallest / Math.max(of, 1));
  const place = placesOn(props, width, pad);
  const top = 30;
  const base = top + of * perMark + 4;
  const full = base - of * perMark;
  const numerals = base + under + 14;
  const height = numerals + 6;
  const steps = stepsOf(bands, place, base, perMark);
  const graduations = graduationsOf(props);
  const isOff = drop !== null && (drop < lo || drop > hi);
  const at = drop === null ? 0 : Math.min(Math.max(place(drop), pad), width - pad);
  const keyX = place(keyAt);
  const keyAnchor = keyX < 110 ? 'start' : keyX > width - 110 ? 'end' : 'middle';
  const mono = { fontFamily: faces.Mono500, fontSize: 12 };
  return (
    <View role="img" aria-label={spoken(props)} onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ minHeight: height }} testID="scale">
      {width === 0 ? null : (
        <Svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} fill="none" aria-hidden>
          {graduations.map(({ at: value, isMajor }) => {
            const x = place(value);
            return isMajor ? (
              <G key={value}>
                <Path d={`M${x},${top - 2} V${base}`} stroke={colors.hair} />
                <Path d={`M${x},${base} V${base + 11}`} stroke={colors.ink2} strokeWidth={1.25} />
                <Path d={`M${x},${base + 11} V${numerals - 13}`} stroke={colors.hair} />
                <SvgText x={x} y={numerals} textAnchor="middle" fontFamily={faces.Mono400} fontSize={12} fill={colors.ink3}>
                  {value.toFixed(decimals)}
                </SvgText>
              </G>
            ) : (
              <Path key={value} d={`M${x},${base} V${base + 5}`} stroke={colors.rule} />
            );
          })}
          {fit === 'editor' ? <Levels of={of} base={base} perMark={perMark} width={width} pad={pad} /> : null}
          {steps.map(({ band, left, right, top: y }, index) => (
            <Rect key={band.name} x={left} y={y} width={right - left} height={base - y} fill={index === steps.length - 1 ? colors.copperMid : colors.copperFaint} />
          ))}
          {steps.length > 0 ? <Path d={outlineOf(steps, base)} stroke={colors.copper} strokeWidth={1.5} strokeLinejoin="round" /> : null}
          {roundings.map(({ at: value, label }) => {
            const x = place(value);
            const isBelow = value < keyAt;
            return (
              <G key={label}>
                <Path d={`M${x},${full - 1} V${base}`} stroke={colors.copper} strokeWidth={1.5} strokeDasharray="3 2.5" />
                <Path d={`M${x - 3.8},${full - 7.5} h7.6 l-3.8,5.4z`} fill={colors.paper} stroke={colors.copper} strokeWidth={1.25} strokeLinejoin="round" />
                <SvgText x={x + (isBelow ? -7 : 7)} y={full - 1} textAnchor={isBelow ? 'end' : 'start'} {...mono} fill={colors.copper}>
                  {label}
                </SvgText>
              </G>
            );
          })}
          {alternatives.map(({ at: value, label, marks }) => (
            <G key={label}>
              <Path d={`M${place(value)},${base - marks * perMark} V${base}`} stroke={colors.copper} strokeWidth={1.5} strokeDasharray="1 3" />
              <SvgText x={place(value)} y={base - marks * perMark - 6} textAnchor="middle" {...mono} fill={colors.copper}>
                {label}
              </SvgText>
            </G>
          ))}
          <Path d={`M${keyX},${full - 3} V${base}`} stroke={colors.copper} strokeWidth={2} />
          <Path d={`M${keyX - 4.5},${full - 8} h9 l-4.5,6z`} fill={colors.copper} />
          <SvgText x={keyX} y={full - 13} textAnchor={keyAnchor} fontFamily={faces.Mono600} fontSize={13} fill={colors.copper} stroke={colors.paper} strokeWidth={5} strokeLinejoin="round" {...({ paintOrder: 'stroke' } as object)}>
            {keyText}
          </SvgText>
          <Path d={`M${pad - 8},${base} H${width - pad + 8}`} stroke={colors.ink} strokeWidth={1.75} strokeLinecap="round" />
          {drop !== null && !isOff ? (
            <>
              <Path d={`M${at},${full - 2} V${base + 7}`} stroke={colors.manganate} strokeWidth={1.75} />
              <Path d={`M${at},${base + 1} c5,7 6.5,9.5 6.5,12.5 a6.5,6.5 0 0 1 -13,0 c0,-3 1.5,-5.5 6.5,-12.5z`} fill={colors.manganateFluid} stroke={colors.manganate} strokeWidth={1.5} />
            </>
          ) : null}
          {drop !== null && isOff ? <OffScale isHigh={drop > hi} width={width} pad={pad} base={base} text={props.dropText ?? String(drop)} /> : null}
        </Svg>
      )}
    </View>
  );
}

function Levels({ of, base, perMark, width, pad }: { of: number; base: number; perMark: number; width: number; pad: number }) {
  const colors = useColors();
  const step = Math.max(1, Math.ceil(of / 6));
  const levels = Array.from({ length: Math.floor(of / step) }, (_, index) => (index + 1) * step);
  return (
    <>
      <SvgText x={2} y={base - of * perMark - 14} fontFamily={faces.Next400} fontSize={13} fill={colors.ink3}>
        marks
      </SvgText>
      {levels.map((level) => (
        <G key={level}>
          <Path d={`M${pad - 8},${base - level * perMark} H${width - pad + 8}`} stroke={colors.hair} strokeDasharray="1 4" />
          <SvgText x={pad - 14} y={base - level * perMark + 4.5} textAnchor="end" fontFamily={faces.Next400} fontSize={13} fill={colors.ink3}>
            {level}
          </SvgText>
        </G>
      ))}
    </>
  );
}

/** A value beyond the ends: a triangle with the value beside it. */
function OffScale({ isHigh, width, pad, base, text }: { isHigh: boolean; width: number; pad: number; base: number; text: string }) {
  const colors = useColors();
  const x = isHigh ? width - pad + 7 : pad - 7;
  return (
    <>
      <Path d={`M${x},${base + 22} l${isHigh ? -7 : 7},-4.5 v9z`} fill={colors.manganate} />
      <SvgText x={x + (isHigh ? -12 : 12)} y={base + 26.5} textAnchor={isHigh ? 'end' : 'start'} fontFamily={faces.Mono500} fontSize={12} fill={colors.manganate} stroke={colors.paper} strokeWidth={4} strokeLinejoin="round" {...({ paintOrder: 'stroke' } as object)}>
        {text}
      </SvgText>
    </>
  );
}
