import { describe, expect, it } from 'vitest';
import { marksText } from './grains';
import { readMarks } from './typed-marks';

describe('marks as typed', () => {
  it('keeps whole marks, halves and thirds exactly', () => {
    expect(readMarks('3')).toEqual({ ok: true, grains: 3600 });
    expect(readMarks('2.5')).toEqual({ ok: true, grains: 3000 });
    expect(readMarks('1/3')).toEqual({ ok: true, grains: 400 });
    expect(readMarks('1 1/3')).toEqual({ ok: true, grains: 1600 });
  });

  it('refuses a share that is no whole number of grains', () => {
    expect(readMarks('1/7')).toMatchObject({ ok: false, message: expect.stringContaining('cannot be kept exactly') });
    expect(readMarks('0.3333')).toMatchObject({ ok: false });
  });

  it('reads back what it writes', () => {
    for (const grains of [1200, 600, 400, 1600, 3000, 12]) {
      const read = readMarks(marksText(grains));
      expect(read).toEqual({ ok: true, grains });
    }
  });

  describe('edge cases', () => {
    it.each(['', ' ', '0', '-1', 'three', '1001', '1..5', 'NaN', '1e99'])('refuses %j', (text) => {
      expect(readMarks(text).ok).toBe(false);
    });

    it('takes a comma and spaces round the number', () => {
      expect(readMarks(' 1,5 ')).toEqual({ ok: true, grains: 1800 });
    });
  });
});
