import { useId, useState, type ReactNode } from 'react';
import { View } from 'react-native';
import Svg, { Defs, Path, Pattern, Rect } from 'react-native-svg';
import { Raised, Symbol, Zeff } from './symbol';
import { Text } from './text';
import { useColors } from './theme';

export interface DerivationColumn {
  readonly subshells: readonly { readonly label: string; readonly electrons: number }[];
  readonly counted: number;
  /** As printed, `0.85`. */
  readonly coefficient: string;
  readonly contribution: string;
  readonly isAsked: boolean;
  /** Further out than the electron asked for: it screens nothing. */
  readonly isOuter: boolean;
  /** A slip puts its own term in the place of the key's, which then stands above it, struck out. */
  readonly keyTerm?: { readonly counted: number; readonly coefficient: string } | undefined;
}

export interface DerivationProps {
  readonly groups: readonly DerivationColumn[];
  readonly nuclearCharge: number;
  readonly sigma: string;
  readonly zeff: string;
  /** Which of the two is the key. */
  readonly asked: 'zeff' | 'sigma';
  /** What follows is a hand's, not the key's. */
  readonly isSlip?: boolean | undefined;
}

/** A computed value group by group: columns with a brace, their sum, then the difference, and a bar as long as the nuclear charge. */
export function Derivation({ groups, nuclearCharge, sigma, zeff, asked, isSlip = false }: DerivationProps) {
  const colors = useColors();
  const hasStruck = groups.some(({ keyTerm }) => keyTerm !== undefined);
  return (
    <View>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', rowGap: 12, columnGap: 4 }}>
        {groups.map((group) => (
          <Column key={group.subshells.map(({ label }) => label).join(' ')} group={group} hasStruck={hasStruck} />
        ))}
      </View>
      {groups.length > 0 ? <View style={{ height: 1.5, backgroundColor: colors.ink2, marginVertical: 6 }} /> : null}
      <Line isKey={asked === 'sigma'} isSlip={isSlip} value={sigma}>
        <Symbol>σ</Symbol>
        <Text tone="ink2">{groups.length > 0 ? ' = sum of the columns' : ' from the table'}</Text>
      </Line>
      <Line isKey={asked === 'zeff'} isSlip={isSlip} value={zeff}>
        <Zeff />
        {' = '}
        <Symbol>Z</Symbol>
        {' − '}
        <Symbol>σ</Symbol>
        <Text tone="ink2">{' = '}</Text>
        <Text variant="readingS" weight={400} tone="ink2">{`${nuclearCharge} − ${sigma}`}</Text>
      </Line>
      <Bar groups={groups} nuclearCharge={nuclearCharge} sigma={sigma} zeff={zeff} isSlip={isSlip} />
    </View>
  );
}

function Column({ group, hasStruck }: { group: DerivationColumn; hasStruck: boolean }) {
  const colors = useColors();
  const { subshells, counted, coefficient, contribution, isAsked, isOuter, keyTerm } = group;
  const electrons = subshells.reduce((sum, subshell) => sum + subshell.electrons, 0);
  const weight = isAsked ? 600 : 400;
  const tone = isOuter ? 'ink3' : 'ink';
  const ours = keyTerm ? 'manganate' : tone;
  return (
    <View style={{ flexGrow: 1, flexBasis: 84, alignItems: 'center' }}>
      <Text variant="body" weight={weight} tone={tone} lines={1}>
        {'('}
        {subshells.map(({ label }, index) => (
          <Text key={label} weight={weight} tone={tone}>
            {index === 0 ? '' : ' '}
            {label.charAt(0)}
            <Symbol>{label.charAt(1)}</Symbol>
          </Text>
        ))}
        {')'}
        <Raised>{String(electrons)}</Raised>
      </Text>
      <Svg width={76} height={9} viewBox="0 0 76 9" fill="none" aria-hidden>
        <Path d="M2,1 Q2,5 6,5 H34 L38,8.5 L42,5 H70 Q74,5 74,1" stroke={isAsked ? colors.copper : colors.rule} strokeWidth={1.5} strokeLinejoin="round" />
      </Svg>
      {keyTerm ? (
        <Text variant="readingS" weight={400} tone="ink3" style={{ textDecorationLine: 'line-through' }} label={`instead of ${keyTerm.counted} × ${keyTerm.coefficient}`}>
          {`${keyTerm.counted} × ${keyTerm.coefficient}`}
        </Text>
      ) : hasStruck ? (
        <Text variant="readingS" />
      ) : null}
      <Text variant="readingS" weight={keyTerm ? 600 : 400} tone={ours}>{`${counted} × ${coefficient}`}</Text>
      <Text variant="reading" tone={ours}>
        {contribution}
      </Text>
    </View>
  );
}

function Line({ children, value, isKey, isSlip }: { children: ReactNode; value: string; isKey: boolean; isSlip: boolean }) {
  return (
    <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', gap: 12 }}>
      <Text style={{ flexShrink: 1 }}>{children}</Text>
      <Text variant={isKey ? 'readingM' : 'reading'} weight={isKey ? 600 : 500} tone={isSlip ? 'manganate' : isKey ? 'copper' : 'ink'}>
        {value}
      </Text>
    </View>
  );
}

/** Hatched parts are screened, the solid rest is what is left. */
function Bar({ groups, nuclearCharge, sigma, zeff, isSlip = false }: Omit<DerivationProps, 'asked'>) {
  const colors = useColors();
  const hatch = useId();
  const [width, setWidth] = useState(0);
  const perCharge = nuclearCharge > 0 ? (width - 2) / nuclearCharge : 0;
  const parts = groups.map(({ contribution }) => Number(contribution) * perCharge);
  const ends = parts.map((_part, index) => parts.slice(0, index + 1).reduce((sum, part) => sum + part, 1));
  const screened = ends.at(-1) ?? 1;
  return (
    <View style={{ marginTop: 10 }} aria-hidden>
      <View onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ height: 20 }}>
        {width === 0 ? null : (
          <Svg width={width} height={20} viewBox={`0 0 ${width} 20`} fill="none">
            <Defs>
              <Pattern id={hatch} width={6} height={6} patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
                <Rect width={6} height={6} fill={colors.paper} />
                <Path d="M0,0V6" stroke={colors.rule} strokeWidth={2.4} />
              </Pattern>
            </Defs>
            {parts.map((part, index) => (part > 0 ? <Rect key={index} x={(ends[index] ?? 1) - part} y={1} width={part} height={18} fill={`url(#${hatch})`} stroke={colors.ink2} /> : null))}
            <Rect x={screened} y={1} width={Math.max(0, width - 1 - screened)} height={18} fill={isSlip ? colors.manganateFluid : colors.copperFluid} stroke={isSlip ? colors.manganate : colors.copper} strokeWidth={1.5} />
          </Svg>
        )}
      </View>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between' }}>
        <Text variant="label" weight={400} tone="ink2">{`screened ${sigma}`}</Text>
        <Text variant="label" weight={600} tone={isSlip ? 'manganate' : 'copper'}>{`left ${zeff}`}</Text>
      </View>
    </View>
  );
}
