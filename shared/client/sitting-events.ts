import { useEffect } from 'react';
import { apiUrl } from './api';

/** Sittings of which the server tells at this moment. */
const told = new Set<string>();

/** Whether changes of a sitting are told by the server, so that nobody has to ask. */
export const isTold = (sittingId: string): boolean => told.has(sittingId);

/** What is needed of the browser's EventSource. */
export interface EventEnd {
  onopen: (() => void) | null;
  onmessage: (() => void) | null;
  onerror: (() => void) | null;
  close(): void;
}

/** Listens to the events of a sitting until the function given back is called. A broken connection is tried again by the browser; meanwhile the sitting is not told of. */
export function listen(sittingId: string, end: EventEnd, onChange: () => void): () => void {
  end.onopen = () => void told.add(sittingId);
  end.onmessage = onChange;
  end.onerror = () => {
    // Looking once starts the asking again.
    if (told.delete(sittingId)) onChange();
  };
  return () => {
    told.delete(sittingId);
    end.close();
  };
}

export function useEventsOf(sittingId: string, onChange: () => void): void {
  useEffect(() => {
    if (typeof EventSource === 'undefined') return undefined;
    return listen(sittingId, new EventSource(apiUrl(`/sittings/${sittingId}/events`), { withCredentials: true }) as unknown as EventEnd, onChange);
  }, [sittingId, onChange]);
}
