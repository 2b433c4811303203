import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { ApiError, OfflineError } from '../../client/api';
import type { ItemDraft, ItemView } from '../../contracts/items';
import { createDraftKeeper } from './draft-keeper';
import { newDraft } from './new-draft';

const itemWith = (draft: ItemDraft, rev = 1): ItemView => ({
  id: 'item-1',
  sittingId: 'sitting-1',
  number: 1,
  draft,
  prompt: '',
  worked: { label: 'Li 2s', key: null, derivation: null, scale: null, roundings: [], bands: [], alternatives: [], slips: [], guard: [], untold: [], others: [], electrons: [], proposedPrompt: '', maxGrains: null, problems: [] },
  maxGrains: 3600,
  hasAnswerBox: false,
  rev,
});

describe('the draft of an item between keyboard and server', () => {
  const first = newDraft(undefined);
  const save = vi.fn<(id: string, rev: number, draft: ItemDraft) => Promise<ItemView>>();
  const start = () => createDraftKeeper(itemWith(first), { save, now: () => Date.now(), later: (work, ms) => setTimeout(work, ms), cancel: (timer) => clearTimeout(timer as NodeJS.Timeout) });

  beforeEach(() => {
    vi.useFakeTimers();
    save.mockReset().mockImplementation((_id, rev, draft) => Promise.resolve(itemWith(draft, rev + 1)));
  });
  afterEach(() => void vi.useRealTimers());

  it('saves by itself a moment after the last edit, with the rev that was seen', async () => {
    const keeper = start();
    keeper.change({ ...first, marks: '2' }, 'marks');
    keeper.change({ ...first, marks: '2.5' }, 'marks');
    expect(keeper.get().save.kind).toBe('waiting');
    await vi.advanceTimersByTimeAsync(1000);
    expect(save).toHaveBeenCalledExactlyOnceWith('item-1', 1, { ...first, marks: '2.5' });
    expect(keeper.get().save.kind).toBe('saved');
    keeper.change({ ...first, marks: '4' }, 'marks');
    await vi.advanceTimersByTimeAsync(1000);
    expect(save.mock.lastCall?.[1]).toBe(2);
  });

  it('takes edits of one field in a row back as one step, and others one by one', async () => {
    const keeper = start();
    keeper.change({ ...first, marks: '2' }, 'marks');
    keeper.change({ ...first, marks: '2.5' }, 'marks');
    keeper.change({ ...first, marks: '2.5', decimals: 1 }, 'decimals');
    keeper.undo();
    expect(keeper.get().draft).toEqual({ ...first, marks: '2.5' });
    keeper.undo();
    expect(keeper.get()).toMatchObject({ draft: first, canUndo: false });
    await vi.advanceTimersByTimeAsync(1000);
    expect(save).not.toHaveBeenCalled();
    expect(keeper.get().save.kind).toBe('saved');
  });

  it('keeps what was typed while it was sending, and sends it next', async () => {
    const keeper = start();
    keeper.change({ ...first, marks: '2' }, 'marks');
    keeper.flush();
    keeper.change({ ...first, marks: '4' }, 'marks');
    await vi.advanceTimersByTimeAsync(2000);
    expect(save.mock.calls.map(([, rev, draft]) => [rev, draft.marks])).toEqual([[1, '2'], [2, '4']]);
  });

  it('names the fields of a refusal and sends again after the next edit', async () => {
    save.mockRejectedValueOnce(new ApiError('invalid_request', 'Write the marks.', { marks: 'Write the marks.' }));
    const keeper = start();
    keeper.change({ ...first, marks: '' }, 'marks');
    await vi.advanceTimersByTimeAsync(1000);
    expect(keeper.get().save).toMatchObject({ kind: 'refused', fields: { marks: 'Write the marks.' } });
    expect(keeper.isUnsaved()).toBe(true);
    keeper.change({ ...first, marks: '1' }, 'marks');
    await vi.advanceTimersByTimeAsync(1000);
    expect(keeper.get().save.kind).toBe('saved');
  });

  it('tries again while the server is not reached', async () => {
    save.mockRejectedValueOnce(new OfflineError());
    const keeper = start();
    keeper.change({ ...first, marks: '2' }, 'marks');
    await vi.advanceTimersByTimeAsync(1000);
    expect(keeper.get().save.kind).toBe('unreached');
    await vi.advanceTimersByTimeAsync(6000);
    expect(keeper.get().save.kind).toBe('saved');
  });

  describe('a conflict', () => {
    const theirs = itemWith({ ...first, marks: '9' }, 7);
    const conflicted = async () => {
      save.mockRejectedValueOnce(new ApiError('conflict', 'Changed meanwhile.', {}, theirs));
      const keeper = start();
      keeper.change({ ...first, marks: '2' }, 'marks');
      await vi.advanceTimersByTimeAsync(1000);
      expect(keeper.get().save.kind).toBe('conflict');
      return keeper;
    };

    it('sends nothing until someone chooses', async () => {
      const keeper = await conflicted();
      keeper.change({ ...first, marks: '3' }, 'marks');
      await vi.advanceTimersByTimeAsync(20_000);
      expect(save).toHaveBeenCalledOnce();
    });

    it('keeps mine over theirs when told to', async () => {
      const keeper = await conflicted();
      keeper.keepMine();
      await vi.advanceTimersByTimeAsync(1000);
      expect(save.mock.lastCall).toEqual(['item-1', 7, { ...first, marks: '2' }]);
    });

    it('takes theirs when told to, and mine comes back by undo', async () => {
      const keeper = await conflicted();
      keeper.takeTheirs();
      expect(keeper.get().draft.marks).toBe('9');
      keeper.undo();
      await vi.advanceTimersByTimeAsync(1000);
      expect(save.mock.lastCall).toEqual(['item-1', 7, { ...first, marks: '2' }]);
    });
  });

  it('takes over what someone else stored while nothing here is unsaved', () => {
    const keeper = start();
    keeper.receive(itemWith({ ...first, marks: '9' }, 2));
    expect(keeper.get().draft.marks).toBe('9');
    keeper.change({ ...first, marks: '1' }, 'marks');
    keeper.receive(itemWith({ ...first, marks: '8' }, 3));
    expect(keeper.get().draft.marks).toBe('1');
  });
});
