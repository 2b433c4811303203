import { describe, expect, it } from 'vitest';
import type { AnswerView } from '../../contracts/ledger';
import { agoWords, conflictWords, eitherWay, marksWords, needsReason, ruledWords, ruleWords } from './ruling';

const reading = (isAsMine: boolean, grains: number | null = 0) => ({ id: 'r', reader: 'reader 1', given: null, grains, note: null, recordedAt: 0, isAsMine });
const ruling = { id: 'u', kind: 'value', text: '6.10', code: null, grains: null, reason: null, isOwn: false, at: 0 } as const;
const held = { state: 'discordant', ruling: null, maxGrains: 3600, score: null, mine: { id: 'm', text: '6.10', code: null, grains: 3600 } } as unknown as AnswerView;

describe('what the button says', () => {
  it('names the value and the mark', () => {
    expect(ruleWords(held)).toBe('Rule 6.10, 3 marks');
    expect(ruleWords({ mine: { id: 'm', text: null, code: 'blank', grains: 0 } })).toBe('Rule blank, 0 marks');
  });

  it('names nothing where the scheme leaves the mark to a person', () => {
    expect(ruleWords({ mine: { id: 'm', text: null, code: 'elsewhere', grains: null } })).toBeNull();
    expect(ruleWords({ mine: null })).toBeNull();
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
