import { useRef, useState, type PointerEvent as ReactPointerEvent } from 'react';
import { Image, View } from 'react-native';
import { useColors } from '../../ui/theme';
import { palettes, radius } from '../../ui/tokens';
import { BoxShape } from './box-shape';
import { drawn, type PageSize, type Rect } from './geometry';
import type { DrawnBox, RegionsAct } from './regions-state';

interface PageCanvasProps {
  readonly page: PageSize;
  readonly sample: string | null;
  readonly boxes: readonly DrawnBox[];
  readonly selected: string | null;
  readonly isLocked: boolean;
  /** Pixels a millimetre. */
  readonly scale: number;
  readonly nameOf: (box: DrawnBox) => string;
  readonly tagOf: (box: DrawnBox) => string;
  readonly dispatch: (act: RegionsAct) => void;
  readonly newId: () => string;
}

interface Point {
  readonly x: number;
  readonly y: number;
}

/** One page with its picture and boxes. A mouse or pen draws on the empty page; a finger scrolls it. */
export function PageCanvas({ page, sample, boxes, selected, isLocked, scale, nameOf, tagOf, dispatch, newId }: PageCanvasProps) {
  const colors = useColors();
  const from = useRef<Point | null>(null);
  const [rubber, setRubber] = useState<Rect | null>(null);
  const width = page.widthMm * scale;
  const height = page.heightMm * scale;

  const pointOf = (event: ReactPointerEvent<HTMLElement>): Point => {
    const { left, top } = event.currentTarget.getBoundingClientRect();
    return { x: (event.clientX - left) / scale, y: (event.clientY - top) / scale };
  };

  const pointers = {
    onPointerDown: (event: ReactPointerEvent<HTMLElement>) => {
      if (event.target !== event.currentTarget) return;
      dispatch({ act: 'select', id: null });
      if (isLocked || event.pointerType === 'touch' || event.button !== 0) return;
      event.currentTarget.setPointerCapture(event.pointerId);
      from.current = pointOf(event);
    },
    onPointerMove: (event: ReactPointerEvent<HTMLElement>) => {
      if (from.current) setRubber(drawn(from.current, pointOf(event), page));
    },
    onPointerUp: (event: ReactPointerEvent<HTMLElement>) => {
      const rect = from.current && drawn(from.current, pointOf(event), page);
      from.current = null;
      setRubber(null);
      if (rect) dispatch({ act: 'draw', id: newId(), rect });
    },
    onPointerCancel: () => {
      from.current = null;
      setRubber(null);
    },
  };

  return (
    <View style={{ width, height, backgroundColor: palettes.light.onFill, borderRadius: radius.scan, boxShadow: `0 1px 3px ${colors.scrim}40` }}>
      {sample === null ? null : (
        <Image source={{ uri: sample }} resizeMode="stretch" aria-hidden style={{ position: 'absolute', width, height, borderRadius: radius.scan }} />
      )}
      <View
        {...(pointers as object)}
        testID="page-canvas"
        style={{ position: 'absolute', width, height, cursor: (isLocked ? 'auto' : 'crosshair') as 'auto' }}
      >
        {boxes.map((box) => (
          <BoxShape
            key={box.id}
            box={box}
            page={page}
            scale={scale}
            isSelected={box.id === selected}
            isLocked={isLocked}
            name={nameOf(box)}
            tag={tagOf(box)}
            dispatch={dispatch}
          />
        ))}
        {rubber && (
          <View
            style={{
              position: 'absolute',
              left: rubber.x * scale,
              top: rubber.y * scale,
              width: rubber.w * scale,
              height: rubber.h * scale,
              borderWidth: 2,
              borderStyle: 'dashed',
              borderColor: palettes.light.manganate,
              pointerEvents: 'none',
            }}
          />
        )}
      </View>
    </View>
  );
}
