import { describe, expect, it } from 'vitest';
import { gutterTicks, gutterWindow } from './gutter-geometry';

describe('the gutter of a long list', () => {
  it('has a tick for each row that is marked, at its place in the whole list', () => {
    expect(gutterTicks([0, 50, 99], 100, 1000)).toEqual([5, 505, 995]);
  });

  it('lets rows that fall on one pixel share a tick', () => {
    expect(gutterTicks([0, 1, 2, 3], 10_000, 500)).toHaveLength(1);
  });

  it('shows which part is on view, never smaller than can be seen', () => {
    expect(gutterWindow(0, 18, 36, 500)).toEqual({ top: 0, height: 250 });
    expect(gutterWindow(9_982, 10_000, 10_000, 500)).toEqual({ top: 480, height: 20 });
  });

  it('is empty for an empty list', () => {
    expect(gutterTicks([], 0, 500)).toEqual([]);
    expect(gutterWindow(0, 0, 0, 500)).toEqual({ top: 0, height: 0 });
  });
});
