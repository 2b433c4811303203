import { useEffect, useRef, type CSSProperties, type ReactNode } from 'react';
import { useColors } from './theme';
import { radius, shadow } from './tokens';

interface PopoverProps {
  readonly id: string;
  readonly label: string;
  readonly onClose: () => void;
  /** Its place on the screen. */
  readonly style: CSSProperties;
  readonly children: ReactNode;
}

/** A small sheet over the screen: it takes the focus; Escape, a press outside it or following a link in it closes it and gives the focus back. */
export function Popover({ id, label, onClose, style, children }: PopoverProps) {
  const colors = useColors();
  const element = useRef<HTMLDivElement>(null);
  useEffect(() => {
    const sheet = element.current;
    sheet?.showPopover();
    sheet?.querySelector<HTMLElement>('a[href], button')?.focus();
  }, []);
  return (
    <div
      ref={element}
      id={id}
      popover="auto"
      role="group"
      aria-label={label}
      onToggle={(event) => {
        if (event.newState === 'closed') onClose();
      }}
      onClick={(event) => {
        if ((event.target as HTMLElement).closest('a[href]')) element.current?.hidePopover();
      }}
      style={{
        position: 'fixed',
        inset: 'auto',
        margin: 0,
        boxSizing: 'border-box',
        padding: 8,
        backgroundColor: colors.paper,
        color: colors.ink,
        border: `1px solid ${colors.rule}`,
        borderRadius: radius.control,
        boxShadow: shadow.toast,
        ...style,
      }}
    >
      {children}
    </div>
  );
}
