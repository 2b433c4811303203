import { describe, expect, it } from 'vitest';
import { alarmsOf } from '../support/paper-alarms';
import { ordinaryItems, simulatedPaper } from '../support/simulated-paper';

// The limits were tuned on seeds 0 to 59 (a key planted) and 1000 to 1059 (none); what follows is counted on others.
// When this was written it came to 99 planted keys of 100, half of them by script 18, and to no alarm on 2,300 right keys.
const seeds = Array.from({ length: 100 }, (_, at) => 100 + at);
const plantedPapers = seeds.map((seed) => ({ seed, items: alarmsOf(simulatedPaper(seed, 60, true)) }));

describe('the alarm on simulated papers of 12 ordinary items', () => {
  it('draws them from 45', () => expect(ordinaryItems).toHaveLength(45));

  it('names a planted wrong key within the first 60 scripts in at least 95 of 100', () => {
    const planted = plantedPapers.flatMap(({ items }) => items.filter(({ item }) => item.isPlanted));
    expect(planted).toHaveLength(100);
    const named = planted.filter(({ raisedAt }) => raisedAt !== null);
    expect(named.length).toBeGreaterThanOrEqual(95);
  });

  it('raises at most 5 alarms for the right keys beside it', () => {
    const raised = plantedPapers.flatMap(({ items }) => items.filter(({ item, raisedAt }) => !item.isPlanted && raisedAt !== null));
    expect(raised.length).toBeLessThanOrEqual(5);
  });

  it('raises at most 5 alarms in 100 papers of right keys, read to the end of 156 scripts', () => {
    const raised = seeds.flatMap((seed) => alarmsOf(simulatedPaper(1000 + seed, 156, false)).filter(({ raisedAt }) => raisedAt !== null));
    expect(raised.length).toBeLessThanOrEqual(5);
  }, 120_000);
});
