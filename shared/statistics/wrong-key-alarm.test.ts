import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readingLead } from './reading-lead';
import { wrongKeyAlarm, type AlarmReading } from './wrong-key-alarm';

// Grounds and limits are ours; chances are worked by hand as powers of 1/2.

const read = (reading: string | null, over: Partial<AlarmReading> = {}): AlarmReading => ({ reading, meetsKey: false, convention: null, share: 0, rest: 0.6, ...over });
const key = (over: Partial<AlarmReading> = {}): AlarmReading => read('3.10', { meetsKey: true, share: 1, ...over });
const times = <T>(n: number, make: (at: number) => T): T[] => Array.from({ length: n }, (_, at) => make(at));
const names = (readings: readonly AlarmReading[], otherFacilities: readonly number[] = []) => wrongKeyAlarm({ readings, otherFacilities }).grounds.map(({ name }) => name);

it('a lead is tested by signs: ten against none is 1 in 1,024, level is no lead', () => {
  expect(readingLead(times(10, () => read('2.85')))).toEqual({ n: 10, reading: '2.85', convention: null, count: 10, meetKey: 0, chance: expect.closeTo(1 / 1024, 12) as number });
  expect(readingLead([read('2.85'), key()])?.chance).toBe(1);
  expect(readingLead([read('b'), read('a')])?.reading).toBe('a');
  expect(readingLead([key(), read(null)])).toBeNull();
});

describe('each ground, with its evidence', () => {
  const someBlank = times(2, () => read('blank', { rest: null }));

  it('commonest reading: alone it raises nothing at 12 readings and an alarm at 40', () => {
    const twelve = [...times(10, () => read('2.85', { rest: null })), ...someBlank];
    expect(wrongKeyAlarm({ readings: twelve, otherFacilities: [] })).toEqual({
      isRaised: false,
      n: 12,
      grounds: [{ name: 'commonest reading', n: 12, reading: '2.85', count: 10, meetKey: 0, chance: expect.closeTo(1 / 1024, 12) as number }],
    });
    const forty = [...twelve, ...times(28, (at) => read(`${at}.00`, { rest: null }))];
    expect(wrongKeyAlarm({ readings: forty, otherFacilities: [] }).isRaised).toBe(true);
    expect(wrongKeyAlarm({ readings: forty.slice(0, 39), otherFacilities: [] }).isRaised).toBe(false);
  });

  it("other convention: the commonest reading is one's value, which makes two grounds", () => {
    const readings = [...times(10, () => read('2.85', { rest: null, convention: 'slater' })), ...someBlank];
    expect(names(readings)).toEqual(['commonest reading', 'other convention']);
    expect(wrongKeyAlarm({ readings, otherFacilities: [] }).isRaised).toBe(true);
  });

  it('best quarter: those best on the other items agree on another value while the weak meet the key', () => {
    const readings = [...times(8, () => read('2.85', { rest: 0.9 })), ...times(24, (at) => (at % 2 ? key({ rest: 0.5 }) : read(`${at}.00`, { rest: 0.5 })))];
    expect(names(readings)).toContain('best quarter');
    expect(names(readings)).not.toContain('commonest reading');
  });

  it('correlation: those who meet the key are the weak ones', () => {
    const readings = times(40, (at) => (at % 2 ? key({ rest: 0.3 + at / 400 }) : read(`${at}.00`, { rest: 0.7 + at / 400 })));
    expect(wrongKeyAlarm({ readings, otherFacilities: [] }).grounds).toEqual([{ name: 'correlation', n: 40, r: expect.any(Number) as number, highest: expect.any(Number) as number }]);
    expect(names(readings.map((one) => ({ ...one, rest: 1 - (one.rest ?? 0) })))).toEqual([]);
  });

  it('a correlation that only just lies below 0 is no ground: with so few it might be above', () => {
    // By hand, from the table 10 10 / 9 11: r = -20 / sqrt(20 x 20 x 19 x 21) = -0.050.
    const restOf = (at: number, isKey: boolean): number => (at < (isKey ? 10 : 9) ? 0.5 : 0.6);
    const readings = [...times(20, (at) => key({ rest: restOf(at, true) })), ...times(20, (at) => read(`${at}.00`, { rest: restOf(at, false) }))];
    expect(names(readings)).toEqual([]);
  });

  it('facility: 1 of 40 where the others have 0.6 in the middle', () => {
    const readings = [key({ rest: null }), ...times(39, (at) => read(`${at}.00`, { rest: null }))];
    expect(names(readings, [0.5, 0.6, 0.8])).toEqual(['facility']);
    expect(names(readings, [0.1, 0.2, 0.3])).toEqual([]);
    expect(names(readings)).toEqual([]);
  });
});

describe('no alarm', () => {
  it('below twelve readings, or for an item that nearly all have right or wrong in many ways', () => {
    expect(wrongKeyAlarm({ readings: times(11, () => read('2.85', { convention: 'scf' })), otherFacilities: [0.6] })).toEqual({ isRaised: false, n: 11, grounds: [] });
    expect(names([...times(38, (at) => key({ rest: at / 40 })), read('2.85', { rest: 0.1 }), read(null, { rest: 0.2 })], [0.5, 0.6])).toEqual([]);
    expect(wrongKeyAlarm({ readings: [], otherFacilities: [] }).isRaised).toBe(false);
  });

  it('the order in which scripts are read changes nothing', () => {
    const one = fc.record({ text: fc.constantFrom('2.85', '3.10', '3.45', null), rest: fc.option(fc.constantFrom(0.2, 0.4, 0.6, 0.8)) });
    fc.assert(
      fc.property(fc.array(one, { minLength: 12, maxLength: 60 }), (list) => {
        const readings = list.map(({ text, rest }) => (text === '3.10' ? key({ rest }) : read(text, { rest, convention: text === '2.85' ? 'scf' : null })));
        const ways = [readings, [...readings].reverse()].map((order) => wrongKeyAlarm({ readings: order, otherFacilities: [0.6, 0.7] }));
        expect(ways[1]?.isRaised).toBe(ways[0]?.isRaised);
        expect(ways[1]?.grounds.map(({ name, n }) => [name, n])).toEqual(ways[0]?.grounds.map(({ name, n }) => [name, n]));
      }),
    );
  });
});
