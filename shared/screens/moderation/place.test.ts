import { describe, expect, it } from 'vitest';
import { countOfHeld, nowhere, placeAfterRuling, settledPlace, steppedPlace } from './place';

const listed = (...ids: string[]) => (row: number): string | undefined => ids[row];

describe('the place in the ledger', () => {
  it('follows its answer when rows before it leave', () => {
    expect(settledPlace({ at: 2, id: 'c' }, listed('b', 'c', 'd'))).toEqual({ at: 1, id: 'c' });
    expect(settledPlace({ at: 0, id: 'a' }, listed('n', 'm', 'a'))).toEqual({ at: 2, id: 'a' });
  });

  it('follows its answer where the list has become shorter than its old row', () => {
    expect(settledPlace({ at: 1, id: 'b' }, listed('b'))).toEqual({ at: 0, id: 'b' });
  });

  it('takes the answer of its row once that has come, and stays the same object while nothing moves', () => {
    expect(settledPlace({ at: 1, id: null }, listed('a', 'b'))).toEqual({ at: 1, id: 'b' });
    const place = { at: 1, id: 'b' };
    expect(settledPlace(place, listed('a', 'b'))).toBe(place);
    expect(settledPlace(place, listed())).toBe(place);
    expect(settledPlace(nowhere, listed('a'))).toBe(nowhere);
  });

  it('stays with an answer that has left the list, and goes on to the one that moved up', () => {
    const place = { at: 1, id: 'b' };
    const idAt = listed('a', 'c', 'd');
    expect(settledPlace(place, idAt)).toBe(place);
    expect(steppedPlace(place, 1, 3, idAt)).toEqual({ at: 1, id: 'c' });
    expect(steppedPlace(place, -1, 3, idAt)).toEqual({ at: 0, id: 'a' });
  });

  it('stops at the ends', () => {
    expect(steppedPlace({ at: 2, id: 'c' }, 1, 3, listed('a', 'b', 'c'))).toEqual({ at: 2, id: 'c' });
    expect(steppedPlace(nowhere, -1, 3, listed('a', 'b', 'c'))).toEqual({ at: 0, id: 'a' });
    expect(steppedPlace(nowhere, 1, 3, listed('a', 'b', 'c'))).toEqual({ at: 0, id: 'a' });
  });
});

describe('after a ruling', () => {
  it('the next row that waits is opened, going round', () => {
    const idAt = listed('a', 'b', 'c', 'd');
    expect(placeAfterRuling({ at: 1, id: 'b' }, [1, 3], 'all', idAt)).toEqual({ at: 3, id: 'd' });
    expect(placeAfterRuling({ at: 3, id: 'd' }, [1, 3], 'to-rule', idAt)).toEqual({ at: 1, id: 'b' });
  });

  it('what was ruled a moment ago is not opened again from an older list', () => {
    expect(placeAfterRuling({ at: 1, id: 'b' }, [0, 1], 'to-rule', listed('a', 'b'), new Set(['a', 'b']))).toBeNull();
  });

  it('with none left the sheet stays, and closes where only what waits is listed', () => {
    const place = { at: 0, id: 'a' };
    expect(placeAfterRuling(place, [0], 'all', listed('a'))).toBe(place);
    expect(placeAfterRuling(place, [0], 'to-rule', listed('a'))).toBeNull();
    expect(placeAfterRuling(place, [0], 'discordant', listed('a'))).toBeNull();
    expect(placeAfterRuling(place, [], 'ruled', listed('a'))).toBe(place);
  });
});

it('counts the held rows from one', () => {
  expect([countOfHeld([4, 9, 12], 9), countOfHeld([4, 9, 12], 5)]).toEqual(['2 of 3', null]);
});
