import { describe, expect, it } from 'vitest';
import { buretteLevel, buretteShape } from './burette-geometry';

describe('the level of a burette', () => {
  it('is the finished stages plus the finished part of the first unfinished one', () => {
    expect(buretteLevel([1, 1, 0.98, 0.2, 0, 0])).toBeCloseTo(2.98);
  });

  it('stands at the top before anything is done and at the foot when all is', () => {
    expect(buretteLevel([0, 0, 0])).toBe(0);
    expect(buretteLevel([1, 1, 1])).toBe(3);
  });

  it('does not fall for work done out of turn', () => {
    expect(buretteLevel([0.5, 1, 1])).toBe(0.5);
  });

  describe('edge cases', () => {
    it('is nothing for no stages and stays within its stage', () => {
      expect(buretteLevel([])).toBe(0);
      expect(buretteLevel([-1, 0])).toBe(0);
    });
  });
});

describe('the drawing of a burette', () => {
  const shape = buretteShape({ stages: 6, step: 72, tubeWidth: 24 });

  it('has a long graduation at every stage', () => {
    expect(shape.graduations.filter(({ isStage }) => isStage).map(({ y }) => y)).toEqual([26, 98, 170, 242, 314, 386, 458]);
  });

  it('puts the lowest part of the curve at the level', () => {
    expect(shape.liquid(3).y).toBe(242);
    expect(shape.liquid(3).curve).toContain('Q32,');
  });

  it('holds nothing when all is done', () => {
    expect(shape.liquid(6).body).toBe('');
  });
});
