import { expect, it } from 'vitest';
import { fitAlone, fitBeside } from './fit';

it('fits two side by side at one scale', () => {
  expect(fitBeside([{ width: 600, height: 200 }, { width: 390, height: 150 }], { width: 1000, height: 400 }, 10)).toBe(1);
  expect(fitBeside([{ width: 600, height: 200 }], { width: 1200, height: 100 }, 10)).toBe(0.5);
});

it('never shows a cut-out more than three times its pixels', () => {
  expect(fitAlone({ width: 10, height: 10 }, { width: 1000, height: 1000 })).toBe(3);
});
