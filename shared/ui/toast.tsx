import { createContext, useCallback, useContext, useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { Icon, type IconName } from './icon';
import { Pressable } from './pressable';
import { Text } from './text';
import { useTheme } from './theme';
import { motion, radius, shadow, size, toastColors } from './tokens';

export interface Toast {
  readonly text: string;
  readonly icon?: IconName | undefined;
  readonly action?: { readonly label: string; readonly icon?: IconName | undefined; readonly onPress: () => void } | undefined;
}

type Show = (toast: Toast) => void;

const ToastContext = createContext<Show | null>(null);

/** Says what was done, with a way back, at the foot of the screen: one at a time, for 8 s, longer while it is touched or has the focus. */
export function ToastProvider({ children }: { children: ReactNode }) {
  const [shown, setShown] = useState<{ readonly toast: Toast; readonly count: number } | null>(null);
  const show = useCallback<Show>((toast) => setShown((before) => ({ toast, count: (before?.count ?? 0) + 1 })), []);
  const hide = useCallback(() => setShown(null), []);
  return (
    <ToastContext.Provider value={show}>
      {children}
      <View style={{ position: 'absolute', left: 0, right: 0, bottom: 24, alignItems: 'center', paddingHorizontal: 16, pointerEvents: 'box-none', zIndex: 30 }}>
        <View role="status" aria-live="polite" style={{ maxWidth: '100%' }}>
          {shown ? <ToastCard key={shown.count} toast={shown.toast} onGone={hide} /> : null}
        </View>
      </View>
    </ToastContext.Provider>
  );
}

export function useToast(): Show {
  const show = useContext(ToastContext);
  if (!show) throw new Error('A toast was shown outside ToastProvider.');
  return show;
}

function ToastCard({ toast, onGone }: { toast: Toast; onGone: () => void }) {
  const { scheme } = useTheme();
  const { ground, text, border } = toastColors[scheme];
  const [isHeld, setHeld] = useState(false);
  const left = useRef<number>(motion.toastStayMs);
  useEffect(() => {
    if (isHeld) return undefined;
    const began = Date.now();
    const timer = setTimeout(onGone, left.current);
    return () => {
      clearTimeout(timer);
      left.current -= Date.now() - began;
    };
  }, [isHeld, onGone]);
  const hold = useMemo(
    () => ({ onPointerEnter: () => setHeld(true), onPointerLeave: () => setHeld(false), onFocus: () => setHeld(true), onBlur: () => setHeld(false) }),
    [],
  );
  return (
    <View
      {...hold}
      testID="toast"
      style={{ flexDirection: 'row', alignItems: 'center', gap: 12, minHeight: 52, maxWidth: '100%', paddingLeft: 16, paddingRight: 8, backgroundColor: ground, borderWidth: 1, borderColor: border, borderRadius: radius.toast, boxShadow: shadow.toast }}
    >
      {toast.icon ? <Icon name={toast.icon} color={text} /> : null}
      <Text variant="small" weight={500} style={{ color: text, flexShrink: 1 }}>
        {toast.text}
      </Text>
      {toast.action ? (
        <Pressable
          onPress={() => {
            toast.action?.onPress();
            onGone();
          }}
          style={() => ({ minHeight: size.touch, flexDirection: 'row', alignItems: 'center', gap: 8, paddingHorizontal: 12, borderRadius: radius.control })}
        >
          <Icon name={toast.action.icon ?? 'takeBack'} color={text} />
          <Text weight={600} style={{ color: text }}>
            {toast.action.label}
          </Text>
        </Pressable>
      ) : null}
    </View>
  );
}
