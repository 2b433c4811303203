import { useEffect, useRef, useState } from 'react';

const holdsFiles = (event: DragEvent): boolean => event.dataTransfer?.types.includes('Files') ?? false;

/** Takes files dropped anywhere on the page; tells whether some are held over it. */
export function useDrop(onFiles: (files: File[]) => void, isOff: boolean): boolean {
  const [isOver, setOver] = useState(false);
  const latest = useRef(onFiles);
  useEffect(() => {
    latest.current = onFiles;
  });
  useEffect(() => {
    if (isOff) return undefined;
    let depth = 0;
    const enter = (event: DragEvent) => {
      if (!holdsFiles(event)) return;
      event.preventDefault();
      depth += 1;
      setOver(true);
    };
    const leave = (event: DragEvent) => {
      if (!holdsFiles(event)) return;
      depth = Math.max(0, depth - 1);
      if (depth === 0) setOver(false);
    };
    const over = (event: DragEvent) => {
      if (holdsFiles(event)) event.preventDefault();
    };
    const drop = (event: DragEvent) => {
      if (!holdsFiles(event)) return;
      event.preventDefault();
      depth = 0;
      setOver(false);
      latest.current(Array.from(event.dataTransfer?.files ?? []));
    };
    const heard = { dragenter: enter, dragleave: leave, dragover: over, drop } as const;
    for (const [name, listener] of Object.entries(heard)) window.addEventListener(name, listener as EventListener);
    return () => {
      for (const [name, listener] of Object.entries(heard)) window.removeEventListener(name, listener as EventListener);
    };
  }, [isOff]);
  return isOver;
}
