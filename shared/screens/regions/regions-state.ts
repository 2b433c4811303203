import type { LayoutView, SentLayout } from '../../contracts/layouts';
import { freePlace, kept, type PageSize, type Rect } from './geometry';

export type BoxUse = LayoutView['boxes'][number]['use'];

export interface DrawnBox extends Rect {
  readonly id: string;
  readonly pageNo: number;
  readonly item: string | null;
  readonly use: BoxUse;
}

interface Drawing {
  readonly pages: readonly PageSize[];
  readonly boxes: readonly DrawnBox[];
}

export interface RegionsState extends Drawing {
  readonly selected: string | null;
  readonly pageNo: number;
  readonly past: readonly Drawing[];
  /** The layout that this was begun from, and its rev. */
  readonly base: Drawing;
  readonly rev: number;
}

export type RegionsAct =
  | { readonly act: 'select'; readonly id: string | null }
  | { readonly act: 'show-page'; readonly pageNo: number }
  | { readonly act: 'draw'; readonly id: string; readonly rect: Rect }
  | { readonly act: 'place'; readonly id: string; readonly item: string | null; readonly use: BoxUse }
  /** Remembers the drawing as it is, before a box is dragged. */
  | { readonly act: 'grab' }
  | { readonly act: 'change'; readonly id: string; readonly rect: Rect }
  | { readonly act: 'assign'; readonly id: string; readonly item: string | null; readonly use: BoxUse }
  | { readonly act: 'remove'; readonly id: string }
  | { readonly act: 'add-page' }
  | { readonly act: 'remove-last-page' }
  | { readonly act: 'undo' }
  | { readonly act: 'reset' }
  | { readonly act: 'stored'; readonly layout: LayoutView }
  /** A newer layout of the server while something here is unsaved: only its rev and pages count, what was drawn stays. */
  | { readonly act: 'pages-stored'; readonly layout: LayoutView };

const mostSteps = 100;

const drawingOf = ({ pages, boxes }: LayoutView): Drawing => ({
  pages: pages.map(({ widthMm, heightMm }) => ({ widthMm, heightMm })),
  boxes: boxes.map(({ id, pageNo, item, use, x, y, w, h }) => ({ id, pageNo, item, use, x, y, w, h })),
});

export function regionsOf(layout: LayoutView, pageNo = 1): RegionsState {
  const base = drawingOf(layout);
  return { ...base, base, rev: layout.rev, selected: null, pageNo: Math.min(pageNo, base.pages.length), past: [] };
}

const plain = ({ pages, boxes }: Drawing): string => JSON.stringify([pages, [...boxes].sort((one, other) => (one.id < other.id ? -1 : 1))]);
export const isUnsaved = (state: RegionsState): boolean => plain(state) !== plain(state.base);

export const sentOf = ({ pages, boxes }: RegionsState): SentLayout => ({ pages: [...pages], boxes: boxes.map((box) => ({ ...box })) });

const remembered = (state: RegionsState): RegionsState => ({ ...state, past: [...state.past.slice(1 - mostSteps), { pages: state.pages, boxes: state.boxes }] });

const withBox = (state: RegionsState, box: DrawnBox): RegionsState => ({ ...remembered(state), boxes: [...state.boxes, box], selected: box.id });

/** The item that a box drawn now is most likely for: the first without an answer box. */
export const nextItem = (state: Drawing, items: readonly string[]): string | null =>
  items.find((item) => !state.boxes.some((box) => box.item === item && box.use === 'answer')) ?? null;

/** Every change of the drawing; `items` are the ids of the paper in order. */
export const regionsReducer =
  (items: readonly string[]) =>
  (state: RegionsState, act: RegionsAct): RegionsState => {
    const page = state.pages[state.pageNo - 1];
    switch (act.act) {
      case 'select':
        return state.selected === act.id ? state : { ...state, selected: act.id };
      case 'show-page':
        return { ...state, pageNo: act.pageNo, selected: null };
      case 'draw': {
        const item = nextItem(state, items);
        const last = items.at(-1) ?? null;
        return withBox(state, { id: act.id, pageNo: state.pageNo, item: item ?? last, use: item === null ? 'working' : 'answer', ...act.rect });
      }
      case 'place': {
        if (!page) return state;
        const others = state.boxes.filter(({ pageNo }) => pageNo === state.pageNo);
        return withBox(state, { id: act.id, pageNo: state.pageNo, item: act.item, use: act.use, ...freePlace(others, page) });
      }
      case 'grab':
        return remembered(state);
      case 'change':
        return { ...state, boxes: state.boxes.map((box) => (box.id === act.id ? { ...box, ...act.rect } : box)) };
      case 'assign':
        return { ...remembered(state), boxes: state.boxes.map((box) => (box.id === act.id ? { ...box, item: act.use === 'number' ? null : act.item, use: act.use } : box)) };
      case 'remove':
        return { ...remembered(state), boxes: state.boxes.filter(({ id }) => id !== act.id), selected: null };
      case 'add-page': {
        const size = state.pages.at(-1);
        return size ? { ...remembered(state), pages: [...state.pages, size], pageNo: state.pages.length + 1, selected: null } : state;
      }
      case 'remove-last-page': {
        const pages = state.pages.slice(0, -1);
        if (pages.length === 0) return state;
        return { ...remembered(state), pages, boxes: state.boxes.filter(({ pageNo }) => pageNo <= pages.length), pageNo: Math.min(state.pageNo, pages.length), selected: null };
      }
      case 'undo': {
        const before = state.past.at(-1);
        return before ? { ...state, ...before, past: state.past.slice(0, -1), selected: null, pageNo: Math.min(state.pageNo, before.pages.length) } : state;
      }
      case 'reset':
        return { ...remembered(state), ...state.base, selected: null, pageNo: Math.min(state.pageNo, state.base.pages.length) };
      case 'stored':
        return regionsOf(act.layout, state.pageNo);
      case 'pages-stored': {
        const base = drawingOf(act.layout);
        const pages = base.pages.length > state.pages.length ? [...state.pages, ...base.pages.slice(state.pages.length)] : state.pages;
        const boxes = state.boxes.map((box) => ({ ...box, ...kept(box, pages[box.pageNo - 1] ?? { widthMm: 210, heightMm: 297 }) }));
        return { ...state, base, rev: act.layout.rev, pages, boxes };
      }
    }
  };
