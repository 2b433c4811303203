import { useState } from 'react';
import type { ItemView } from '../../contracts/items';
import { Button } from '../../ui/button';
import { LockDialog } from './lock-dialog';
import { words } from './words';

interface LockButtonProps {
  readonly sittingId: string;
  readonly items: readonly ItemView[];
}

/** What still keeps the paper open, in one sentence; null when nothing does. */
export function whyNotLocked(items: readonly ItemView[]): string | null {
  if (items.length === 0) return words.lock.noItems;
  for (const { number, worked } of items) {
    const [problem] = worked.problems;
    if (problem) return words.lock.problem(number, problem.message);
  }
  const without = items.find(({ hasAnswerBox }) => !hasAnswerBox);
  return without ? words.lock.noBox(without.number) : null;
}

/** Locks the paper; closed with the line that says what opens it. */
export function LockButton({ sittingId, items }: LockButtonProps) {
  const [isOpen, setOpen] = useState(false);
  const why = whyNotLocked(items);
  return (
    <>
      <Button kind="primary" onPress={() => setOpen(true)} closed={why ?? undefined} testID="lock-paper">
        {words.lock.button}
      </Button>
      {isOpen ? <LockDialog sittingId={sittingId} onClose={() => setOpen(false)} /> : null}
    </>
  );
}
