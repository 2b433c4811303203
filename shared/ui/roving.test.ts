import { describe, expect, it } from 'vitest';
import { rovingTo } from './roving';

describe('arrow keys in a group', () => {
  it('go to the neighbours and round the ends', () => {
    expect(rovingTo('ArrowRight', 0, 3)).toBe(1);
    expect(rovingTo('ArrowDown', 2, 3)).toBe(0);
    expect(rovingTo('ArrowLeft', 0, 3)).toBe(2);
  });

  it('take Home and End to the ends', () => {
    expect(rovingTo('Home', 2, 3)).toBe(0);
    expect(rovingTo('End', 0, 3)).toBe(2);
  });

  it('leave other keys and empty groups alone', () => {
    expect(rovingTo('Enter', 0, 3)).toBeNull();
    expect(rovingTo('ArrowRight', 0, 0)).toBeNull();
  });
});
