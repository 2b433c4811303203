import { memo } from 'react';
import { View } from 'react-native';
import Svg, { Line, Path, Rect, Text as SvgText } from 'react-native-svg';
import type { PreviewPage } from '../../contracts/printings';
import { frameLineMm } from '../../sheets/geometry';
import { faces, shadow } from '../../ui/tokens';

const faceOf = { text: faces.Next400, strong: faces.Next600, value: faces.Mono500, symbol: faces.Stix } as const;
/** Paper stays white and ink black in both themes, as a scan does. */
const paper = '#FFFFFF';
const ink = '#000000';
const ruled = '#B3BCB9';

interface SheetPageProps {
  readonly page: PreviewPage;
  readonly widthMm: number;
  readonly heightMm: number;
  /** Pixels wide. */
  readonly width: number;
  readonly label: string;
}

/** One page as it will be printed, drawn from the plan the printing uses. */
export const SheetPage = memo(function SheetPage({ page, widthMm, heightMm, width, label }: SheetPageProps) {
  return (
    <View role="img" aria-label={label} testID="sheet-page" style={{ width, height: (width * heightMm) / widthMm, backgroundColor: paper, boxShadow: shadow.scan }}>
      <Svg width="100%" height="100%" viewBox={`0 0 ${widthMm} ${heightMm}`} aria-hidden>
        {page.lines.map(({ x1, x2, y }, index) => (
          <Line key={index} x1={x1} x2={x2} y1={y} y2={y} stroke={ruled} strokeWidth={0.25} />
        ))}
        {page.frames.map((frame, index) => (
          <Rect key={index} x={frame.x} y={frame.y} width={frame.w} height={frame.h} fill="none" stroke={ink} strokeWidth={frameLineMm} />
        ))}
        {page.codes.map((path, index) => (
          <Path key={index} d={path} fill={ink} />
        ))}
        {page.words.map(({ fount, sizeMm, text, x, y, side }, index) => (
          <SvgText key={index} x={x} y={y} fontFamily={faceOf[fount]} fontSize={sizeMm} textAnchor={side === 'left' ? 'start' : 'end'} fill={ink}>
            {text}
          </SvgText>
        ))}
      </Svg>
    </View>
  );
});
