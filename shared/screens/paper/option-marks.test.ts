import { expect, it } from 'vitest';
import { optionMarks } from './option-marks';

it('spreads values over the line, the least first', () => {
  const marks = optionMarks(['4.55', '5.20', '3.90'], 460);
  expect(marks.map(({ number, x, row }) => [number, Math.round(x), row])).toEqual([[3, 30, 0], [1, 230, 0], [2, 430, 0]]);
});

it('writes close values in two rows, so that no number covers another', () => {
  const marks = optionMarks(['3.90', '3.95', '3.98', '9.00'], 360);
  for (const row of [0, 1]) {
    const places = marks.filter((mark) => mark.row === row).map(({ labelX }) => labelX);
    places.slice(1).forEach((place, index) => expect(place - (places[index] ?? 0)).toBeGreaterThanOrEqual(56));
  }
  expect(marks.map(({ row }) => row)).toContain(1);
});

it('stands equal values at the middle, and leaves out what has none', () => {
  expect(optionMarks(['2.60', null], 300)).toEqual([{ number: 1, text: '2.60', x: 150, labelX: 150, row: 0 }]);
  expect(optionMarks([null, null], 300)).toEqual([]);
});
