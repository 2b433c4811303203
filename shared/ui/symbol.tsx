import { Text as NativeText } from 'react-native';
import { faces, lower, raise, symbolScale, type, type TypeStyle } from './tokens';

interface PieceProps {
  readonly children: string;
  /** The style of the text around it. */
  readonly beside?: TypeStyle;
}

/** A symbol, such as Z, sigma or an orbital letter: STIX italic, a tenth larger than the text beside it, always of regular weight. */
export function Symbol({ children, beside = 'body' }: PieceProps) {
  return <NativeText style={{ fontFamily: faces.Stix, fontSize: type[beside].size * symbolScale, fontWeight: '400' }}>{children}</NativeText>;
}

/** Raised digits and signs, nested in a line of text: a count of electrons, a charge. */
export function Raised({ children, beside = 'body' }: PieceProps) {
  const { size } = type[beside];
  return <NativeText style={{ fontFamily: faces.Mono500, fontSize: size * raise.size, position: 'relative', top: -size * raise.rise }}>{children}</NativeText>;
}

/** The upright, lowered label of a symbol. */
export function Lowered({ children, beside = 'body' }: PieceProps) {
  const { size } = type[beside];
  return <NativeText style={{ fontSize: size * lower.size, position: 'relative', top: size * lower.drop }}>{children}</NativeText>;
}

/** Z with the label eff. */
export function Zeff({ beside = 'body' }: { beside?: TypeStyle }) {
  return (
    <NativeText aria-label="Z eff">
      <Symbol beside={beside}>Z</Symbol>
      <Lowered beside={beside}>eff</Lowered>
    </NativeText>
  );
}

/** `Cl 3p` with the orbital letter as a symbol; texts without a subshell stay as they are. */
export function ElectronLabel({ children, beside = 'body' }: PieceProps) {
  const match = /^(.*?)(\d)([spdf])$/.exec(children);
  if (!match) return <>{children}</>;
  return (
    <>
      {match[1]}
      {match[2]}
      <Symbol beside={beside}>{match[3] ?? ''}</Symbol>
    </>
  );
}
