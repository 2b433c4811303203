import { describe, expect, it } from 'vitest';
import type { LayoutView } from '../../contracts/layouts';
import { isUnsaved, nextItem, regionsOf, regionsReducer, sentOf, type RegionsAct, type RegionsState } from './regions-state';

const layout: LayoutView = {
  ordinal: 1,
  isLocked: false,
  pages: [{ pageNo: 1, widthMm: 210, heightMm: 297, sample: null }],
  boxes: [{ id: 'a', pageNo: 1, item: 'one', use: 'answer', x: 120, y: 20, w: 60, h: 20 }],
  itemsWithoutBox: [],
  rev: 3,
};
const reduce = regionsReducer(['one', 'two']);
const after = (...acts: RegionsAct[]): RegionsState => acts.reduce(reduce, regionsOf(layout));
const rect = { x: 10, y: 10, w: 30, h: 12 };

describe('drawing the regions of a paper', () => {
  it('gives a box that is drawn to the first item without one, then as working', () => {
    const state = after({ act: 'draw', id: 'b', rect });
    expect(state.boxes.at(-1)).toEqual({ id: 'b', pageNo: 1, item: 'two', use: 'answer', ...rect });
    expect(nextItem(state, ['one', 'two'])).toBeNull();
    expect(reduce(state, { act: 'draw', id: 'c', rect }).boxes.at(-1)).toMatchObject({ item: 'two', use: 'working' });
  });

  it('knows what is unsaved, and nothing is after taking it back', () => {
    const drawn = after({ act: 'draw', id: 'b', rect });
    expect(isUnsaved(drawn)).toBe(true);
    expect(isUnsaved(reduce(drawn, { act: 'undo' }))).toBe(false);
    expect(isUnsaved(reduce(drawn, { act: 'reset' }))).toBe(false);
    expect(isUnsaved(reduce(reduce(drawn, { act: 'reset' }), { act: 'undo' }))).toBe(true);
  });

  it('drags in one step of undo', () => {
    const state = after({ act: 'grab' }, { act: 'change', id: 'a', rect }, { act: 'change', id: 'a', rect: { ...rect, x: 20 } });
    expect(state.boxes[0]).toMatchObject({ x: 20 });
    expect(reduce(state, { act: 'undo' }).boxes[0]).toMatchObject({ x: 120 });
  });

  it('frees a box from its item when it becomes the box for the candidate number', () => {
    expect(after({ act: 'assign', id: 'a', item: 'one', use: 'number' }).boxes[0]).toMatchObject({ item: null, use: 'number' });
  });

  it('adds pages, and removes the last with its boxes', () => {
    const two = after({ act: 'add-page' }, { act: 'place', id: 'b', item: 'two', use: 'answer' });
    expect(two).toMatchObject({ pageNo: 2, pages: [{}, {}] });
    expect(two.boxes.at(-1)).toMatchObject({ pageNo: 2 });
    const one = reduce(two, { act: 'remove-last-page' });
    expect(one).toMatchObject({ pageNo: 1, boxes: [{ id: 'a' }] });
    expect(reduce(one, { act: 'remove-last-page' }).pages).toHaveLength(1);
  });

  it('keeps what was drawn when a picture of a page is stored meanwhile', () => {
    const drawn = after({ act: 'draw', id: 'b', rect });
    const state = reduce(drawn, { act: 'pages-stored', layout: { ...layout, rev: 4, pages: [...layout.pages, { pageNo: 2, widthMm: 210, heightMm: 297, sample: 'x' }] } });
    expect(state).toMatchObject({ rev: 4, pages: [{}, {}] });
    expect(sentOf(state).boxes.map(({ id }) => id)).toEqual(['a', 'b']);
  });
});
