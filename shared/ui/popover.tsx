import { useEffect, useRef, type CSSProperties, type ReactNode } from 'react';
import { createPortal } from 'react-dom';
import { useColors } from './theme';
import { radius, shadow } from './tokens';

interface PopoverProps {
  readonly id: string;
  readonly label: string;
  readonly onClose: () => void;
  readonly style: CSSProperties;
  readonly children: ReactNode;
}

/** A small sheet over the screen, at a fixed place: it takes the focus, and Escape, a press outside or following a link in it closes it. */
export function Popover({ id, label, onClose, style, children }: PopoverProps) {
  const colors = useColors();
  const element = useRef<HTMLDivElement>(null);
  const close = useRef(onClose);
  useEffect(() => {
    close.current = onClose;
  });
  useEffect(() => {
    const before = document.activeElement;
    const inside = element.current?.querySelector<HTMLElement>('a[href], button');
    (inside ?? element.current)?.focus();
    const outside = (event: PointerEvent) => {
      if (!element.current?.contains(event.target as Node)) close.current();
    };
    document.addEventListener('pointerdown', outside, true);
    return () => {
      document.removeEventListener('pointerdown', outside, true);
      if (before instanceof HTMLElement && (document.activeElement === document.body || element.current?.contains(document.activeElement))) before.focus();
    };
  }, []);
  return createPortal(
    <div
      ref={element}
      id={id}
      role="group"
      aria-label={label}
      tabIndex={-1}
      onKeyDown={(event) => {
        if (event.key !== 'Escape') return;
        event.stopPropagation();
        onClose();
      }}
      onClick={(event) => {
        if ((event.target as HTMLElement).closest('a[href]')) onClose();
      }}
      style={{ position: 'fixed', zIndex: 20, boxSizing: 'border-box', padding: 8, backgroundColor: colors.paper, border: `1px solid ${colors.rule}`, borderRadius: radius.control, boxShadow: shadow.toast, ...style }}
    >
      {children}
    </div>,
    document.body,
  );
}
