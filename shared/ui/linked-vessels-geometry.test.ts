import { expect, it } from 'vitest';
import { linkedVessels, vesselLiquid, vesselSize, vesselWalls } from './linked-vessels-geometry';

it('stands each vessel lower than what runs into it', () => {
  const { places, width } = linkedVessels(4, [{ from: 0, to: 1 }, { from: 1, to: 3 }, { from: 0, to: 3 }], 96);
  const heights = places.map(({ y }) => y);
  expect([heights[1]! > heights[0]!, heights[3]! > heights[1]!, heights[2] === heights[0], width]).toEqual([true, true, true, 384]);
});

it('leads a siphon out of the one liquid, over every rim between, into the other', () => {
  const shape = linkedVessels(3, [{ from: 0, to: 2 }, { from: 1, to: 2 }], 96);
  const [far = '', near = ''] = shape.tubes;
  const over = (tube: string) => Number(/V([\d.]+)/.exec(tube)?.[1]);
  const rims = shape.places.map(({ y }) => y);
  expect(over(far)).toBeLessThan(over(near));
  expect(over(near)).toBeLessThan(Math.min(...rims));
  expect(over(far)).toBeGreaterThan(0);
  // The two come in beside each other.
  const end = (tube: string) => Number(/ ([\d.]+),[\d.]+ V[\d.]+$/.exec(tube)?.[1]);
  expect(end(near) - end(far)).toBe(6);
});

it('keeps one vessel without links whole, its curve under the rim', () => {
  const { places, tubes, height } = linkedVessels(1, [], 96);
  const [place = { x: 0, y: 0 }] = places;
  expect([tubes, height > place.y + vesselSize.height]).toEqual([[], true]);
  expect(vesselWalls(place)).toContain(`V${place.y}`);
  expect(vesselLiquid(place).body.endsWith('Z')).toBe(true);
});
