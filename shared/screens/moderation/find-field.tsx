import { useEffect, useRef, useState, type Ref } from 'react';
import type { TextInput } from 'react-native';
import { Vessel } from '../../ui/vessel';
import { words } from './words';

const settleMs = 250;

interface FindFieldProps {
  /** What the address asks for. */
  readonly asked: string;
  readonly onFind: (find: string) => void;
  readonly inputRef: Ref<TextInput>;
}

/** What is typed goes into the address once it has stood still for a moment; what the address brings by other ways comes into the field. */
export function FindField({ asked, onFind, inputRef }: FindFieldProps) {
  const [text, setText] = useState(asked);
  const [seen, setSeen] = useState(asked);
  const [sent, setSent] = useState(asked);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  if (asked !== seen) {
    setSeen(asked);
    if (asked !== sent) {
      setText(asked);
      setSent(asked);
    }
  }
  useEffect(() => () => clearTimeout(timer.current), []);
  const change = (typed: string) => {
    setText(typed);
    clearTimeout(timer.current);
    timer.current = setTimeout(() => {
      setSent(typed.trim());
      onFind(typed.trim());
    }, settleMs);
  };
  return <Vessel label={words.find} value={text} onChange={change} height={40} maxLength={64} inputRef={inputRef} testID="ledger-find" />;
}
