import { useRef, type KeyboardEvent as ReactKeyboardEvent, type PointerEvent as ReactPointerEvent } from 'react';
import { View, type ViewStyle } from 'react-native';
import { Text } from '../../ui/text';
import { palettes } from '../../ui/tokens';
import { dragged, moved, resized, type Handle, type PageSize, type Rect } from './geometry';
import type { DrawnBox, RegionsAct } from './regions-state';

interface BoxShapeProps {
  readonly box: DrawnBox;
  readonly page: PageSize;
  readonly scale: number;
  readonly isSelected: boolean;
  readonly isLocked: boolean;
  readonly name: string;
  readonly tag: string;
  readonly dispatch: (act: RegionsAct) => void;
}

const corners = ['nw', 'ne', 'sw', 'se'] as const;
const handleArea = 28;
const handleDot = 11;

const arrows: Readonly<Record<string, readonly [number, number]>> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, -1], ArrowDown: [0, 1] };

/** Styles of the web that the types of React Native do not know. */
const webStyle = (style: Readonly<Record<string, string>>): ViewStyle => style as ViewStyle;

/** Paper stays white in both themes, so what is drawn on it keeps the light colours. */
const colors = palettes.light;

interface Grip {
  readonly handle: Handle;
  readonly rect: Rect;
  readonly x: number;
  readonly y: number;
  readonly hasMoved: boolean;
}

/** A box on the page: dragged by its middle, resized by its corners, or both by the arrow keys. */
export function BoxShape({ box, page, scale, isSelected, isLocked, name, tag, dispatch }: BoxShapeProps) {
  const grip = useRef<Grip | null>(null);
  const inPx = { left: box.x * scale, top: box.y * scale, width: box.w * scale, height: box.h * scale };

  const take = (handle: Handle) => ({
    onPointerDown: (event: ReactPointerEvent<HTMLElement>) => {
      event.stopPropagation();
      dispatch({ act: 'select', id: box.id });
      // A finger on a box that is not chosen may be scrolling: the first touch only chooses it.
      if (isLocked || event.button !== 0 || (event.pointerType === 'touch' && !isSelected)) return;
      event.currentTarget.setPointerCapture(event.pointerId);
      grip.current = { handle, rect: box, x: event.clientX, y: event.clientY, hasMoved: false };
    },
    onPointerMove: (event: ReactPointerEvent<HTMLElement>) => {
      const held = grip.current;
      if (!held) return;
      const [dx, dy] = [event.clientX - held.x, event.clientY - held.y];
      if (!held.hasMoved) {
        if (Math.abs(dx) + Math.abs(dy) < 3) return;
        dispatch({ act: 'grab' });
        grip.current = { ...held, hasMoved: true };
      }
      dispatch({ act: 'change', id: box.id, rect: dragged(held.rect, held.handle, dx / scale, dy / scale, page) });
    },
    onPointerUp: () => void (grip.current = null),
    onPointerCancel: () => void (grip.current = null),
  });

  const onKeyDown = (event: ReactKeyboardEvent<HTMLElement>) => {
    if (isLocked) return;
    const step = arrows[event.key];
    if (step) {
      event.preventDefault();
      const [dx, dy] = step;
      dispatch({ act: 'grab' });
      dispatch({ act: 'change', id: box.id, rect: event.shiftKey ? resized(box, 'se', dx, dy, page) : moved(box, dx, dy, page) });
    } else if (event.key === 'Delete' || event.key === 'Backspace') {
      event.preventDefault();
      dispatch({ act: 'remove', id: box.id });
    } else if (event.key === 'Escape') {
      dispatch({ act: 'select', id: null });
    }
  };

  const line = isSelected ? colors.manganate : colors.ink;
  const isTagBelow = box.y * scale < 20;
  return (
    <>
      <View
        {...({ ...take('move'), onKeyDown, tabIndex: 0, 'aria-pressed': isSelected, onFocus: () => dispatch({ act: 'select', id: box.id }) } as object)}
        role="button"
        aria-label={name}
        testID={`box-${box.id}`}
        style={{
          position: 'absolute',
          ...inPx,
          borderWidth: isSelected ? 2 : 1.5,
          borderColor: line,
          borderStyle: box.use === 'working' ? 'dashed' : box.use === 'number' ? 'dotted' : 'solid',
          backgroundColor: isSelected ? `${colors.manganateFaint}99` : `${colors.paper}40`,
          ...webStyle({ cursor: isLocked ? 'pointer' : 'move', touchAction: isSelected && !isLocked ? 'none' : 'auto' }),
        }}
      />
      <View style={{ position: 'absolute', left: inPx.left, top: isTagBelow ? inPx.top + inPx.height : inPx.top - 18, pointerEvents: 'none' }} aria-hidden>
        <Text variant="micro" weight={600} lines={1} style={{ color: line, backgroundColor: `${colors.paper}E6`, paddingHorizontal: 3 }}>
          {tag}
        </Text>
      </View>
      {isSelected && !isLocked
        ? corners.map((corner) => (
            <View
              key={corner}
              {...(take(corner) as object)}
              testID={`handle-${corner}`}
              style={{
                position: 'absolute',
                left: inPx.left + (corner.endsWith('e') ? inPx.width : 0) - handleArea / 2,
                top: inPx.top + (corner.startsWith('s') ? inPx.height : 0) - handleArea / 2,
                width: handleArea,
                height: handleArea,
                alignItems: 'center',
                justifyContent: 'center',
                ...webStyle({ cursor: `${corner}-resize`, touchAction: 'none' }),
              }}
            >
              <View style={{ width: handleDot, height: handleDot, borderRadius: handleDot / 2, backgroundColor: colors.paper, borderWidth: 2, borderColor: colors.manganate }} />
            </View>
          ))
        : null}
    </>
  );
}
