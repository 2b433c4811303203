import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { after, depthAt, fitHomography, fitSimilarity, inverse, mapped, rmsOf, scaleAt, type Homography, type Point } from './homography';

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const corners: readonly Point[] = [9, 97.5, 186].flatMap((x) => [9, 273].map((y) => ({ x, y })));
/** A4 on a picture at about 200 dpi: turned by anything, mirrored or not, seen aslant by up to a tenth. */
const anyMap = fc
  .record({ turn: between(0, 2 * Math.PI), perMm: between(3, 25), hand: fc.constantFrom(1, -1), g: between(-5e-4, 5e-4), h: between(-5e-4, 5e-4), x: between(-500, 3000), y: between(-500, 3000) })
  .map(({ turn, perMm, hand, g, h, x, y }): Homography => [perMm * Math.cos(turn) * hand, -perMm * Math.sin(turn), x, perMm * Math.sin(turn) * hand, perMm * Math.cos(turn), y, g, h, 1])
  .filter((map) => corners.every((corner) => depthAt(map, corner) > 0.5));
const pairsBy = (map: Homography) => corners.map((from) => ({ from, to: mapped(map, from) }));
const everywhere: readonly Point[] = [0, 50, 105, 210].flatMap((x) => [0, 99, 297].map((y) => ({ x, y })));

it('finds again the map that points were seen through, turned, mirrored and aslant', () => {
  fc.assert(
    fc.property(anyMap, (map) => {
      const found = fitHomography(pairsBy(map));
      expect(found).not.toBeNull();
      for (const point of everywhere) {
        const [seen, expected] = [mapped(found ?? [], point), mapped(map, point)];
        expect(Math.hypot(seen.x - expected.x, seen.y - expected.y)).toBeLessThan(1e-4);
      }
    }),
  );
});

it('goes back by its inverse, and two maps in a row are one', () => {
  fc.assert(
    fc.property(anyMap, anyMap, (map, other) => {
      for (const point of corners) {
        const back = mapped(inverse(map), mapped(map, point));
        expect(Math.hypot(back.x - point.x, back.y - point.y)).toBeLessThan(1e-5);
      }
      const [once, twice] = [mapped(after(inverse(other), map), { x: 100, y: 100 }), mapped(inverse(other), mapped(map, { x: 100, y: 100 }))];
      expect(Math.hypot(once.x - twice.x, once.y - twice.y)).toBeLessThan(1e-4 * (1 + Math.hypot(twice.x, twice.y)));
    }),
  );
});

it('takes points that are seen a little off by least squares: no other map lies nearer', () => {
  fc.assert(
    fc.property(anyMap, fc.array(between(-1, 1), { minLength: 12, maxLength: 12 }), (map, errors) => {
      const pairs = pairsBy(map).map(({ from, to }, index) => ({ from, to: { x: to.x + (errors[2 * index] ?? 0), y: to.y + (errors[2 * index + 1] ?? 0) } }));
      expect(rmsOf(fitHomography(pairs) ?? [], pairs)).toBeLessThan(rmsOf(map, pairs) * 1.2 + 1e-6);
    }),
  );
});

it('fits turn, scale and shift to one code, mirrored too', () => {
  fc.assert(
    fc.property(between(0, 2 * Math.PI), between(3, 25), fc.constantFrom(1, -1), (turn, perMm, hand) => {
      const map: Homography = [perMm * Math.cos(turn) * hand, -perMm * Math.sin(turn), 800, perMm * Math.sin(turn) * hand, perMm * Math.cos(turn), 900, 0, 0, 1];
      const code = [[9, 9], [24, 9], [24, 24], [9, 24]].map(([x = 0, y = 0]) => ({ from: { x, y }, to: mapped(map, { x, y }) }));
      const found = fitSimilarity(code) ?? [];
      for (const point of everywhere) {
        const [seen, expected] = [mapped(found, point), mapped(map, point)];
        expect(Math.hypot(seen.x - expected.x, seen.y - expected.y)).toBeLessThan(1e-4);
      }
      expect(scaleAt(found, { x: 100, y: 100 })).toBeCloseTo(perMm, 6);
    }),
  );
});

describe('edge cases', () => {
  it('has no map for too few points, or for points on one line', () => {
    expect(fitHomography(pairsBy([1, 0, 0, 0, 1, 0, 0, 0, 1]).slice(0, 3))).toBeNull();
    expect(fitHomography([0, 1, 2, 3, 4].map((x) => ({ from: { x, y: 0 }, to: { x, y: 0 } })))).toBeNull();
    expect(fitSimilarity([])).toBeNull();
  });

  it('a quarter turn sends right to down', () => {
    const turned = fitHomography(corners.map(({ x, y }) => ({ from: { x, y }, to: { x: 297 - y, y: x } }))) ?? [];
    expect(mapped(turned, { x: 10, y: 0 }).y).toBeCloseTo(10, 9);
    expect(mapped(turned, { x: 0, y: 10 }).x).toBeCloseTo(287, 9);
  });
});
