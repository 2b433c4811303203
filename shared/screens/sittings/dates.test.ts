import { describe, expect, it } from 'vitest';
import { isDay } from './dates';

describe('a day as typed', () => {
  it('is one of the calendar', () => {
    expect(isDay('2026-05-06')).toBe(true);
    expect(isDay('2028-02-29')).toBe(true);
  });

  it.each(['2026-02-29', '2026-13-01', '6 May 2026', '2026-5-6', '', '2026-05-06T10:00'])('is not %j', (text) => {
    expect(isDay(text)).toBe(false);
  });
});
