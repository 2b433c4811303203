import { describe, expect, it } from 'vitest';
import type { AnswerView } from '../../contracts/ledger';
import { agoWords, conflictWords, differInMethodOnly, eitherWay, marksWords, needsReason, ruledWords, ruleWords, saidOf } from './ruling';

const reading = (isAsMine: boolean, grains: number | null = 0) => ({ id: 'r', reader: 'reader 1', given: null, grains, note: null, method: [], recordedAt: 0, isAsMine });
const ruling = { id: 'u', kind: 'value', text: '6.10', code: null, grains: null, method: [], reason: null, isOwn: false, at: 0 } as const;
const mine = { id: 'm', text: '6.10', code: null, method: [], grains: 3600, waitsFor: null };
const held = { state: 'discordant', ruling: null, maxGrains: 3600, score: null, methodMarks: [], mine } as unknown as AnswerView;

describe('what the button says', () => {
  it('names the value and the mark', () => {
    expect(ruleWords(held)).toBe('Rule 6.10, 3 marks');
    expect(ruleWords({ methodMarks: [], mine: { ...mine, text: null, code: 'blank', grains: 0 } })).toBe('Rule blank, 0 marks');
  });

  it('names nothing where the scheme leaves the mark to a person', () => {
    expect(ruleWords({ methodMarks: [], mine: { ...mine, text: null, code: 'elsewhere', grains: null } })).toBeNull();
    expect(ruleWords({ methodMarks: [], mine: null })).toBeNull();
  });

  const methodMarks = [{ id: 'a', text: 'groups', grains: 600 }, { id: 'b', text: 'sum', grains: 600 }];

  it('names the method marks struck', () => {
    expect(ruleWords({ methodMarks, mine: { ...mine, method: ['b'] } })).toBe('Rule 6.10 with method 2, 3 marks');
    expect(['a', null].map((id) => saidOf({ text: null, code: 'blank', method: id === null ? [] : [id] }, methodMarks))).toEqual(['blank with method 1', 'blank']);
    expect(saidOf({ text: '6.1', code: null, method: [] }, methodMarks)).toBe('6.1 with no method mark');
  });

  it('promises no mark that waits for an earlier item', () => {
    expect(ruleWords({ methodMarks: [], mine: { ...mine, grains: null, waitsFor: 2 } })).toBe('Rule 6.10; its mark waits for item 2');
  });

  it('counts one mark as one', () => {
    expect([marksWords(1200), marksWords(3000), marksWords(0)]).toEqual(['1 mark', '2.5 marks', '0 marks']);
  });
});

describe('when a reason is asked', () => {
  it('not for one of two readings of a held answer', () => expect(needsReason({ ...held, readings: [reading(true), reading(false)] })).toBe(false));
  it('for neither of them', () => expect(needsReason({ ...held, readings: [reading(false), reading(false)] })).toBe(true));
  it('for an answer that stands', () => expect(needsReason({ ...held, state: 'concordant', readings: [reading(true), reading(true)] })).toBe(true));
  it('over another ruling', () => expect(needsReason({ ...held, state: 'ruled', ruling, readings: [reading(true)] })).toBe(true));
});

describe('when someone else was first', () => {
  it('says what stands', () => {
    const current = { ...held, ruling, score: { grains: 3600, why: { head: '', detail: '' }, schemeOrdinal: 1 } };
    expect(conflictWords(current, 60_000)).toBe('Someone ruled this a minute ago: 6.10, 3 marks. Yours was not stored.');
    expect(conflictWords(held, 60_000)).toBeNull();
  });

  it('says a mark ruled by hand as a mark', () => expect(ruledWords({ ...ruling, kind: 'mark', text: null, grains: 1200 }, 0)).toBe('1 mark'));

  it('says how long ago', () => {
    expect([0, 59, 90, 60 * 26, 60 * 50].map((minutes) => agoWords(minutes * 60_000))).toEqual(['a minute ago', '59 minutes ago', '2 hours ago', 'a day ago', '2 days ago']);
  });
});

describe('two values with one mark', () => {
  it('are said to matter to the value alone', () => expect(eitherWay({ state: 'discordant', maxGrains: 3600, readings: [reading(false, 0), reading(false, 0)] })).toBe('Either way 0 of 3.'));
  it('not where the marks differ, one is kept back, or the readings agree', () => {
    expect(eitherWay({ state: 'discordant', maxGrains: 3600, readings: [reading(false, 0), reading(false, 3600)] })).toBeNull();
    expect(eitherWay({ state: 'discordant', maxGrains: 3600, readings: [reading(false, null), reading(false, null)] })).toBeNull();
    expect(eitherWay({ state: 'concordant', maxGrains: 3600, readings: [reading(false, 0), reading(false, 0)] })).toBeNull();
  });
});

describe('readings that differ in the method marks alone', () => {
  const read = (text: string, method: string[]) => ({ ...reading(false), given: { text, code: null }, method });
  const numeric = { kind: 'numeric', units: [] } as const;
  it('are told from those that differ in value or form', () => {
    expect(differInMethodOnly({ ...numeric, readings: [read('6,1', ['a']), read('6.1', [])] })).toBe(true);
    expect(differInMethodOnly({ ...numeric, readings: [read('6.10', ['a']), read('6.1', [])] })).toBe(false);
    expect(differInMethodOnly({ ...numeric, readings: [read('6.1', ['a', 'b']), read('6.1', ['b', 'a'])] })).toBe(false);
  });
  it('not while one is covered, nor of one alone', () => {
    expect(differInMethodOnly({ ...numeric, readings: [reading(false), read('6.1', ['a'])] })).toBe(false);
    expect(differInMethodOnly({ ...numeric, readings: [read('6.1', ['a'])] })).toBe(false);
  });
});
