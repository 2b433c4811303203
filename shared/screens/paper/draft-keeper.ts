import { ApiError, OfflineError } from '../../client/api';
import type { ItemDraft, ItemView } from '../../contracts/items';

export type SaveState =
  | { readonly kind: 'saved'; readonly at: number | null }
  | { readonly kind: 'waiting' }
  | { readonly kind: 'sending' }
  | { readonly kind: 'refused'; readonly message: string; readonly fields: Readonly<Record<string, string>> }
  | { readonly kind: 'conflict'; readonly current: ItemView }
  | { readonly kind: 'unreached' };

export interface KeptDraft {
  readonly draft: ItemDraft;
  readonly save: SaveState;
  readonly canUndo: boolean;
}

export interface DraftKeeper {
  get(): KeptDraft;
  subscribe(changed: () => void): () => void;
  /** Edits of one field that follow each other closely are one step of undo. */
  change(draft: ItemDraft, field: string): void;
  undo(): void;
  /** Stores at once what is not stored yet. */
  flush(): void;
  /** What the server has now; taken over while nothing of ours is unsaved. */
  receive(item: ItemView): void;
  takeTheirs(): void;
  keepMine(): void;
  isUnsaved(): boolean;
}

interface Means {
  save(itemId: string, rev: number, draft: ItemDraft): Promise<ItemView>;
  now(): number;
  later(work: () => void, ms: number): unknown;
  cancel(timer: unknown): void;
}

const saveAfterMs = 700;
const tryAgainMs = 5_000;
const oneStepMs = 1_200;
const mostSteps = 100;

const isSame = (one: ItemDraft, other: ItemDraft): boolean => JSON.stringify(one) === JSON.stringify(other);

/** The draft of one item between keyboard and server: local history, saving by itself, the rev that was seen. */
export function createDraftKeeper(item: ItemView, means: Means): DraftKeeper {
  let draft = item.draft;
  let stored = item.draft;
  let rev = item.rev;
  let save: SaveState = { kind: 'saved', at: null };
  let steps: ItemDraft[] = [];
  let lastEdit = { field: '', at: -Infinity };
  let timer: unknown = null;
  let shown: KeptDraft | null = null;
  const listeners = new Set<() => void>();

  const tell = (next?: SaveState) => {
    if (next) save = next;
    shown = null;
    for (const changed of listeners) changed();
  };

  const schedule = (ms: number) => {
    means.cancel(timer);
    timer = means.later(() => void send(), ms);
  };

  const refusedBy = (error: unknown): SaveState => {
    if (error instanceof OfflineError) return { kind: 'unreached' };
    if (!(error instanceof ApiError)) return { kind: 'unreached' };
    if (error.code === 'conflict' && error.current !== undefined) return { kind: 'conflict', current: error.current as ItemView };
    return { kind: 'refused', message: error.message, fields: error.fields };
  };

  async function send(): Promise<void> {
    means.cancel(timer);
    if (save.kind === 'sending' || save.kind === 'conflict') return;
    if (isSame(draft, stored)) {
      tell({ kind: 'saved', at: save.kind === 'saved' ? save.at : means.now() });
      return;
    }
    const sent = draft;
    tell({ kind: 'sending' });
    try {
      const answer = await means.save(item.id, rev, sent);
      rev = answer.rev;
      stored = sent;
      tell(isSame(draft, sent) ? { kind: 'saved', at: means.now() } : { kind: 'waiting' });
      if (save.kind === 'waiting') schedule(saveAfterMs);
    } catch (error) {
      const refused = refusedBy(error);
      const isStale = !isSame(draft, sent) && refused.kind === 'refused';
      tell(isStale ? { kind: 'waiting' } : refused);
      if (isStale) schedule(saveAfterMs);
      if (refused.kind === 'unreached') schedule(tryAgainMs);
    }
  }

  const put = (next: ItemDraft) => {
    draft = next;
    if (save.kind === 'sending' || save.kind === 'conflict') {
      tell();
      return;
    }
    tell({ kind: 'waiting' });
    schedule(saveAfterMs);
  };

  return {
    get: () => (shown ??= { draft, save, canUndo: steps.length > 0 }),
    subscribe: (changed) => {
      listeners.add(changed);
      return () => void listeners.delete(changed);
    },
    change: (next, field) => {
      if (isSame(next, draft)) return;
      const at = means.now();
      const isOneStep = field === lastEdit.field && at - lastEdit.at < oneStepMs;
      if (!isOneStep) steps = [...steps.slice(-mostSteps + 1), draft];
      lastEdit = { field, at };
      put(next);
    },
    undo: () => {
      const before = steps.at(-1);
      if (!before) return;
      steps = steps.slice(0, -1);
      lastEdit = { field: '', at: -Infinity };
      put(before);
    },
    flush: () => {
      if (save.kind === 'waiting' || save.kind === 'unreached') void send();
    },
    receive: (item) => {
      if (item.rev <= rev || save.kind !== 'saved' || !isSame(draft, stored)) return;
      rev = item.rev;
      if (isSame(item.draft, draft)) return;
      draft = item.draft;
      stored = item.draft;
      steps = [];
      tell();
    },
    takeTheirs: () => {
      if (save.kind !== 'conflict') return;
      const { current } = save;
      steps = [...steps.slice(-mostSteps + 1), draft];
      draft = current.draft;
      stored = current.draft;
      rev = current.rev;
      tell({ kind: 'saved', at: null });
    },
    keepMine: () => {
      if (save.kind !== 'conflict') return;
      rev = save.current.rev;
      stored = save.current.draft;
      tell({ kind: 'waiting' });
      void send();
    },
    isUnsaved: () => !isSame(draft, stored),
  };
}
