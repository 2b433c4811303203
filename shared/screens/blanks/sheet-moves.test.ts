import { describe, expect, it } from 'vitest';
import { movedTo, nextPlace } from './sheet-moves';

const items = [1, 4].map((number) => ({ id: `item-${number}`, number, label: '', count: 3 }));

describe('sheets of boxes', () => {
  it('go on with the rest of the item, then with the next item, then end', () => {
    expect(nextPlace({ items, itemId: 'item-1', cursor: 'a' }, 2)).toEqual({ item: 'item-1', cursor: 'a', round: 2 });
    expect(nextPlace({ items, itemId: 'item-1', cursor: null }, 2)).toEqual({ item: 'item-4', round: 2 });
    expect(nextPlace({ items, itemId: 'item-4', cursor: null }, 2)).toBeNull();
    expect(nextPlace({ items: [], itemId: null, cursor: null }, 2)).toBeNull();
  });

  it('are walked by arrows that stop at the edges', () => {
    const grid = { count: 7, columns: 3 };
    expect(['ArrowRight', 'ArrowLeft', 'ArrowDown', 'ArrowUp', 'Home', 'End', 'x'].map((key) => movedTo(key, 3, grid))).toEqual([4, 2, 6, 0, 0, 6, null]);
    expect([movedTo('ArrowLeft', 0, grid), movedTo('ArrowDown', 6, grid)]).toEqual([0, 6]);
  });
});
