import { describe, expect, it } from 'vitest';
import { progressSteps, progressTicks } from './progress-geometry';

describe('the progress rule', () => {
  it('has a round number of things between two graduations', () => {
    expect(progressSteps(156, 20)).toEqual({ step: 10, long: 50 });
    expect(progressSteps(2080, 24)).toEqual({ step: 100, long: 500 });
  });

  it('begins at nothing and ends at or before all', () => {
    const ticks = progressTicks(156, 20);
    expect(ticks[0]).toEqual({ at: 0, isLong: true });
    expect(ticks.at(-1)).toEqual({ at: 150, isLong: true });
  });

  it('draws nothing for nothing', () => {
    expect(progressTicks(0, 20)).toEqual([]);
  });
});
