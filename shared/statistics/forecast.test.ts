import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { forecast, forecastChoices, type Workload } from './forecast';
import { finishingTimes, shareOut } from './plan-of-work';

// The counts are worked by hand; common practice, no source.

const HOUR = 3_600_000;
const work: Workload = { answers: 1248, done: 0, secondsPerReading: 6, atRisk: 0.63, discordant: 0.02 };

describe('hours of a second-reading policy', () => {
  it('by risk: 832 second readings of 1,248, 2,080 in all; read twice throughout 2,496', () => {
    // 1,248 x (0.63 + 0.37 x 0.1) = 832.4; 832 x 0.02 = 16.6; (1,248 + 832 + 17) x 6 s = 3.495 h.
    expect(forecast(work, { policy: 'by risk', share: 0.1 })).toEqual({ first: 1248, second: 832, third: 17, hours: (2097 * 6) / 3600 });
    const all = forecast(work, { policy: 'all' });
    expect(all.first + all.second).toBe(2496);
  });

  it('none costs the first readings, a share its part, and what is done costs nothing more', () => {
    expect(forecast(work, { policy: 'none' })).toEqual({ first: 1248, second: 0, third: 0, hours: 2.08 });
    expect(forecast(work, { policy: 'share', share: 0.25 }).second).toBe(312);
    expect(forecast({ ...work, done: 1248 }, { policy: 'none' }).hours).toBe(0);
    expect(forecast({ ...work, done: 2000 }, { policy: 'none' }).hours).toBe(0);
  });

  it('none is never more than a share, that never more than by risk, and that never more than all', () => {
    const share = fc.double({ min: 0, max: 1, noNaN: true });
    fc.assert(
      fc.property(fc.nat(5000), share, share, (answers, atRisk, random) => {
        const [none, all, some, byRisk] = forecastChoices({ ...work, answers, atRisk }, random).map(({ hours }) => hours);
        expect([none, some, byRisk, all]).toEqual([none, some, byRisk, all].map(Number).sort((one, other) => one - other));
      }),
    );
  });
});

describe('a plan of work', () => {
  const reader = { reader: 'reader one', readings: 120, secondsPerReading: 30, windows: [{ from: 2 * HOUR, to: 4 * HOUR }, { from: 0, to: HOUR / 2 }] };

  it('runs through the times offered: an hour of readings in a half and a half is done at 2.5 h', () => {
    expect(finishingTimes([reader], 0)).toEqual({ readers: [{ reader: 'reader one', finishesAt: 2.5 * HOUR, hoursMissing: 0 }], finishesAt: 2.5 * HOUR, hoursMissing: 0 });
  });

  it('leaves out what has gone by', () => expect(finishingTimes([reader], HOUR).finishesAt).toBe(3 * HOUR));

  it('says the hours missing, and no finish of the whole while there are', () => {
    const { readers, finishesAt, hoursMissing } = finishingTimes([reader, { ...reader, reader: 'reader two', readings: 480 }], 0);
    expect(readers.map((one) => one.hoursMissing)).toEqual([0, 1.5]);
    expect([finishesAt, hoursMissing]).toEqual([null, 1.5]);
  });

  it('with nothing to read is done now, and overlapping times count once', () => {
    expect(finishingTimes([{ ...reader, readings: 0 }], HOUR).finishesAt).toBe(HOUR);
    expect(finishingTimes([{ ...reader, windows: [{ from: 0, to: HOUR }, { from: 0, to: HOUR }] }], 0).finishesAt).toBe(HOUR);
    expect(finishingTimes([], 5)).toEqual({ readers: [], finishesAt: 5, hoursMissing: 0 });
  });
});

describe('sharing out evenly', () => {
  it('by hours offered and pace: 100 over 2 h and 1 h are 67 and 33', () => {
    expect(shareOut(100, [{ reader: 'a', hours: 2, secondsPerReading: 6 }, { reader: 'b', hours: 1, secondsPerReading: 6 }])).toEqual([67, 33]);
    expect(shareOut(90, [{ reader: 'a', hours: 1, secondsPerReading: 4 }, { reader: 'b', hours: 1, secondsPerReading: 8 }])).toEqual([60, 30]);
    expect(shareOut(7, [{ reader: 'a', hours: 0, secondsPerReading: 6 }])).toEqual([0]);
  });

  it('gives out every reading, and to each within one of what is due', () => {
    const offer = fc.record({ reader: fc.constant('a'), hours: fc.integer({ min: 1, max: 12 }), secondsPerReading: fc.integer({ min: 3, max: 20 }) });
    fc.assert(
      fc.property(fc.nat(4000), fc.array(offer, { minLength: 1, maxLength: 8 }), (readings, offers) => {
        const shares = shareOut(readings, offers);
        const all = offers.reduce((sum, { hours, secondsPerReading }) => sum + hours / secondsPerReading, 0);
        expect(shares.reduce((sum, share) => sum + share, 0)).toBe(readings);
        shares.forEach((share, at) => {
          const one = offers[at];
          if (one) expect(Math.abs(share - (readings * one.hours) / one.secondsPerReading / all)).toBeLessThan(1 + 1e-9);
        });
      }),
    );
  });
});
