import { expect, it } from 'vitest';
import { inkOf } from './ink';
import type { Grey } from './pixels';

const pxPerMm = 150 / 25.4;
const size = { width: 350, height: 112 };

/** A box inside with paper at 240 and some noise; `dark` says how much darker a point is. */
function inside(dark: (xMm: number, yMm: number) => number): Grey {
  const data = new Uint8Array(size.width * size.height);
  for (let at = 0; at < data.length; at += 1) data[at] = 240 - ((at * 7919) % 5) - dark((at % size.width) / pxPerMm, Math.floor(at / size.width) / pxPerMm);
  return { ...size, data };
}
const within = (value: number, from: number, to: number): boolean => value >= from && value < to;
const inkIn = (grey: Grey, isBilevel = false) => inkOf({ inside: grey, pxPerMm, frameContrast: 190, isBilevel });

it('finds paper blank, and a stroke of pen or pencil written', () => {
  expect(inkIn(inside(() => 0))).toBe('blank');
  expect(inkIn(inside((x, y) => (within(x, 20, 20.5) && within(y, 5, 10) ? 160 : 0)))).toBe('written');
  expect(inkIn(inside((x, y) => (within(x, 20, 20.6) && within(y, 5, 10) ? 60 : 0)))).toBe('written');
});

it('asks somebody about a dot and about a trace', () => {
  expect(inkIn(inside((x, y) => (within(x, 20, 20.34) && within(y, 5, 5.34) ? 160 : 0)))).toBe('unsure');
  expect(inkIn(inside((x, y) => (within(x, 20, 20.6) && within(y, 5, 10) ? 20 : 0)))).toBe('unsure');
});

it('takes shadows, streaks from edge to edge and a rest of the frame for no ink', () => {
  expect(inkIn(inside((x) => x))).toBe('blank');
  expect(inkIn(inside((x) => (within(x, 30, 30.5) ? 120 : 0)))).toBe('blank');
  expect(inkIn(inside((_, y) => (y < 0.3 ? 150 : 0)))).toBe('blank');
});

it('never calls a box blank on a picture of black and white', () => {
  expect(inkIn(inside(() => 0), true)).toBe('unsure');
  expect(inkIn(inside((x, y) => (within(x, 20, 20.5) && within(y, 5, 10) ? 160 : 0)), true)).toBe('written');
});
