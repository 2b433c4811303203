import { G, Path, Rect } from 'react-native-svg';
import type { ScaleFrame } from './scale-frame';
import { outlineOf, stepsOf } from './scale-geometry';
import type { ScaleProps } from './scale-props';
import { SvgWords } from './svg-words';
import { useColors } from './theme';

interface PartProps {
  readonly scale: ScaleProps;
  readonly frame: ScaleFrame;
}

/** The levels of the marks, with their numbers. */
export function Levels({ of, frame: { base, perMark, width, pad } }: { of: number; frame: ScaleFrame }) {
  const colors = useColors();
  const step = Math.max(1, Math.ceil(of / 6));
  const levels = Array.from({ length: Math.floor(of / step) }, (_, index) => (index + 1) * step);
  return (
    <>
      <SvgWords x={2} y={base - of * perMark - 14} face="Next400" tone="ink3">
        marks
      </SvgWords>
      {levels.map((level) => (
        <G key={level}>
          <Path d={`M${pad - 8},${base - level * perMark} H${width - pad + 8}`} stroke={colors.hair} strokeDasharray="1 4" />
          <SvgWords x={pad - 14} y={base - level * perMark + 4.5} anchor="end" face="Next400" tone="ink3">
            {String(level)}
          </SvgWords>
        </G>
      ))}
    </>
  );
}

/** Bands as nested steps whose height is their marks. */
export function Bands({ scale: { bands = [] }, frame: { place, base, perMark } }: PartProps) {
  const colors = useColors();
  const steps = stepsOf(bands, place, base, perMark);
  return (
    <>
      {steps.map(({ band, left, right, top: y }, index) => (
        <Rect key={band.name} x={left} y={y} width={right - left} height={base - y} fill={index === steps.length - 1 ? colors.copperMid : colors.copperFaint} />
      ))}
      {steps.length > 0 ? <Path d={outlineOf(steps, base)} stroke={colors.copper} strokeWidth={1.5} strokeLinejoin="round" /> : null}
    </>
  );
}

/** The key as a line with a full triangle; accepted roundings that stand apart as broken lines with an open one; alternatives dotted. */
export function KeyMarks({ scale, frame }: PartProps) {
  const colors = useColors();
  const { keyAt, keyText, roundings = [], alternatives = [] } = scale;
  const { place, base, full, perMark, width } = frame;
  const x = place(keyAt);
  const half = (keyText.length * 7.9) / 2;
  const textX = Math.min(Math.max(x, half + 2), Math.max(half + 2, width - half - 2));
  return (
    <>
      {roundings.map(({ at, label }) => {
        const isBelow = at < keyAt;
        return (
          <G key={label}>
            <Path d={`M${place(at)},${full - 1} V${base}`} stroke={colors.copper} strokeWidth={1.5} strokeDasharray="3 2.5" />
            <Path d={`M${place(at) - 3.8},${full - 7.5} h7.6 l-3.8,5.4z`} fill={colors.paper} stroke={colors.copper} strokeWidth={1.25} strokeLinejoin="round" />
            <SvgWords x={place(at) + (isBelow ? -7 : 7)} y={full - 1} anchor={isBelow ? 'end' : 'start'} face="Mono500" size={12} tone="copper">
              {label}
            </SvgWords>
          </G>
        );
      })}
      {alternatives.map(({ at, label, marks }) => (
        <G key={label}>
          <Path d={`M${place(at)},${base - marks * perMark} V${base}`} stroke={colors.copper} strokeWidth={1.5} strokeDasharray="1 3" />
          <SvgWords x={place(at)} y={base - marks * perMark - 6} anchor="middle" face="Mono500" size={12} tone="copper" halo="paper">
            {label}
          </SvgWords>
        </G>
      ))}
      <Path d={`M${x},${full - 3} V${base}`} stroke={colors.copper} strokeWidth={2} />
      <Path d={`M${x - 4.5},${full - 8} h9 l-4.5,6z`} fill={colors.copper} />
      <SvgWords x={textX} y={full - 13} anchor="middle" face="Mono600" tone="copper" halo="paper">
        {keyText}
      </SvgWords>
    </>
  );
}

/** Slips as diamonds on stems of their marks' height, with name or letter; those beyond the ends are named at the top with a triangle. */
export function SlipMarks({ frame, nameY }: { frame: ScaleFrame; nameY: (row: number) => number }) {
  const colors = useColors();
  const { base, perMark, width, pad, slips, offSlips } = frame;
  const high = offSlips.filter(({ isHigh }) => isHigh);
  const low = offSlips.filter(({ isHigh }) => !isHigh);
  const listed = (some: typeof offSlips) => {
    const [only] = some;
    if (some.length === 1 && only?.words && frame.nameRows > 0 && slips.every(({ label }) => label !== null)) {
      const after = only.text === undefined ? '' : `, ${only.text}`;
      return typeof only.words === 'string' ? `${only.words}${after}` : [...only.words, { text: after }];
    }
    return some.map(({ letters }) => letters).join(', ');
  };
  return (
    <>
      {slips.map(({ x, letters, words, marks, isFitting, label }) => {
        const y = base - marks * perMark - (marks > 0 ? 0 : 5);
        const tone = isFitting ? 'manganate' : 'ink2';
        return (
          <G key={letters}>
            {marks > 0 ? <Path d={`M${x},${base} V${y + 5}`} stroke={colors.ink2} strokeWidth={1.5} /> : null}
            {label && words !== null ? (
              <>
                <Path d={`M${x},${nameY(label.row) + 5} V${y - 6}`} stroke={colors.rule} strokeDasharray="1.5 2.5" />
                <SvgWords x={label.anchor === 'start' ? x - 1 : label.anchor === 'end' ? x + 1 : x} y={nameY(label.row)} anchor={label.anchor} tone={tone} halo="paper">
                  {words}
                </SvgWords>
              </>
            ) : (
              <SvgWords x={isFitting ? x - 10 : x} y={isFitting ? y + 4.5 : y - 9} anchor={isFitting ? 'end' : 'middle'} face="Mono600" size={12} tone={tone} halo="paper">
                {letters}
              </SvgWords>
            )}
            <Path d={`M${x},${y - 5} l5,5 -5,5 -5,-5z`} fill={isFitting ? colors.manganateFaint : colors.paper} stroke={colors[tone]} strokeWidth={isFitting ? 2 : 1.5} />
          </G>
        );
      })}
      {high.length > 0 ? (
        <>
          <Path d={`M${width - pad + 7},8.5 l-7,-4.5 v9z`} fill={colors.ink2} />
          <SvgWords x={width - pad - 5} y={13} anchor="end">
            {listed(high)}
          </SvgWords>
        </>
      ) : null}
      {low.length > 0 ? (
        <>
          <Path d={`M${pad - 7},8.5 l7,-4.5 v9z`} fill={colors.ink2} />
          <SvgWords x={pad + 5} y={13}>
            {listed(low)}
          </SvgWords>
        </>
      ) : null}
    </>
  );
}
