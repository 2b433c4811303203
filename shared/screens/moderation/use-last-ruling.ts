import { useRef, useState } from 'react';
import { useTakeBackRuling } from '../../client/ledger';
import type { AnswerView } from '../../contracts/ledger';
import { useToast } from '../../ui/toast';
import { words } from './words';

export interface LastRuling {
  /** What was done last, in words, or null. */
  readonly text: string | null;
  /** Takes the last ruling back, while there is one. */
  readonly onTakeBack: (() => void) | null;
  readonly isBusy: boolean;
  readonly keep: (answer: AnswerView, what: string) => void;
  /** Answers this person has ruled on here, without those taken back. */
  readonly ruled: () => ReadonlySet<string>;
  /** Takes back the ruling that stands on an answer. */
  readonly takeBack: (answer: AnswerView) => void;
}

/** The last ruling of this person and the way back from it: in the toast, in the sheet that covers it on a phone, and by its key. */
export function useLastRuling(isOwn: (answerId: string) => void): LastRuling {
  const toast = useToast();
  const { mutate, isPending } = useTakeBackRuling();
  const [text, setText] = useState<string | null>(null);
  const ruled = useRef(new Set<string>());
  const [answer, setAnswer] = useState<AnswerView | null>(null);
  const takeBack = ({ ruling, answerId, candidateNumber }: AnswerView) => {
    if (ruling === null || isPending) return;
    isOwn(answerId);
    mutate(ruling.id, {
      onSuccess: (after) => {
        if (after.ruling === null) ruled.current.delete(answerId);
        setAnswer((kept) => (kept?.ruling?.id === ruling.id ? null : kept));
        setText(words.sheet.takenBack(candidateNumber));
        toast({ text: words.sheet.takenBack(candidateNumber), icon: 'takeBack' });
      },
      onError: (error) => {
        setText(error.message);
        toast({ text: error.message, icon: 'warning' });
      },
    });
  };
  return {
    text,
    onTakeBack: answer === null ? null : () => takeBack(answer),
    isBusy: isPending,
    keep: (now, what) => {
      isOwn(now.answerId);
      ruled.current.add(now.answerId);
      setAnswer(now);
      const said = words.sheet.ruled(what, now.candidateNumber);
      setText(said);
      toast({ text: said, icon: 'check', action: { label: words.sheet.takeBack, onPress: () => takeBack(now) } });
    },
    ruled: () => ruled.current,
    takeBack,
  };
}
