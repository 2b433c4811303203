import { describe, expect, it } from 'vitest';
import { isTold, listen, type EventEnd } from './sitting-events';

const standIn = (): EventEnd & { isClosed: boolean } => ({ onopen: null, onmessage: null, onerror: null, isClosed: false, close() { this.isClosed = true; } });

describe('the events of a sitting', () => {
  it('are told from the first answer until they break off, and looked for again then', () => {
    const end = standIn();
    let looks = 0;
    const stop = listen('s1', end, () => (looks += 1));
    expect(isTold('s1')).toBe(false);
    end.onopen?.();
    end.onmessage?.();
    expect([isTold('s1'), isTold('s2'), looks]).toEqual([true, false, 1]);
    end.onerror?.();
    end.onerror?.();
    expect([isTold('s1'), looks]).toEqual([false, 2]);
    end.onopen?.();
    stop();
    expect([isTold('s1'), end.isClosed]).toEqual([false, true]);
  });
});
