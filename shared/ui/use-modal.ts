import { useEffect, useRef, type RefObject, type SyntheticEvent } from 'react';

interface Modal {
  readonly ref: RefObject<HTMLDialogElement | null>;
  readonly onCancel: (event: SyntheticEvent) => void;
  readonly onClick: (event: SyntheticEvent) => void;
}

/** Opens the browser's own dialog: it keeps the focus, Escape and a press beside it close it, and the focus goes back to where it was. */
export function useModal(onClose: () => void): Modal {
  const ref = useRef<HTMLDialogElement>(null);
  useEffect(() => {
    const dialog = ref.current;
    const before = document.activeElement;
    dialog?.showModal();
    return () => {
      dialog?.close();
      if (before instanceof HTMLElement) before.focus();
    };
  }, []);
  return {
    ref,
    onCancel: (event) => {
      event.preventDefault();
      onClose();
    },
    onClick: (event) => {
      if (event.target === event.currentTarget) onClose();
    },
  };
}
