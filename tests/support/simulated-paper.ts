import { randomFrom, type Random } from '../../db/seed/truth/random';
import { occupiedElectrons } from '../../shared/chemistry/configurations';
import { elementByNumber } from '../../shared/chemistry/elements';
import { decimal, toDecimals, type Exact } from '../../shared/chemistry/exact';
import { work } from '../../shared/chemistry/work';
import { isRounding } from '../../shared/marking/rounding';
import { conventionValues, slipValues, type WrongValue } from '../../shared/marking/watch/wrong-values';

/** An ordinary item with what candidates may write on it. */
export interface OrdinaryItem {
  readonly name: string;
  readonly key: Exact;
  readonly conventions: readonly WrongValue[];
  readonly slips: readonly Weighted[];
}

interface Weighted {
  readonly weight: number;
  readonly choice: Exact;
}

function ordinaryItem(symbol: string, electron: string): OrdinaryItem {
  const asked = { symbol, charge: 0, electron, quantity: 'zeff', convention: 'slater' } as const;
  const worked = work(asked);
  if (!worked.ok) throw new Error(worked.problem.message);
  return {
    name: `${symbol} ${electron}`,
    key: worked.value.value,
    conventions: conventionValues(asked),
    slips: slipValues(asked).map(({ value }, rank) => ({ weight: 1 / (rank + 1), choice: value })),
  };
}

/** The outermost s or p electron of the neutral atoms He to Kr, and 3d of Sc to Zn. Common exam practice, no source. */
export const ordinaryItems: readonly OrdinaryItem[] = Array.from({ length: 35 }, (_, index) => index + 2).flatMap((number) => {
  const element = elementByNumber(number);
  if (!element.ok) throw new Error(element.problem.message);
  const { symbol } = element.value;
  const occupied = occupiedElectrons(symbol, 0);
  const outermost = (occupied.ok ? occupied.value : []).filter((label) => /[sp]$/.test(label)).at(-1) ?? '';
  return [outermost, ...(number >= 21 && number <= 30 ? ['3d'] : [])].map((electron) => ordinaryItem(symbol, electron));
});

export interface SimulatedItem {
  readonly item: OrdinaryItem;
  /** What the scheme says: the item's own key, or another convention's value planted in its place. */
  readonly key: Exact;
  readonly isPlanted: boolean;
  /** Share of candidates that have the item's own key. */
  readonly facility: number;
  /** The item's slips with their weights among these candidates: each class has mistakes of its own. */
  readonly slips: readonly Weighted[];
}

export interface SimulatedPaper {
  readonly items: readonly SimulatedItem[];
  /** What stands in the box, script by script and item by item; null a blank. */
  readonly scripts: readonly (readonly (string | null)[])[];
}

/** The stated simulator; every share in it is ours, no source. */
const ITEMS = 12;
const BLANKS = 0.08;
const OTHER_NUMBERS = 0.12;
const ONE_DECIMAL = 0.1;
/** How far a class departs from the order of the catalogue: the deviation of the logarithm of a slip's weight. */
const SPREAD = 1;
/** How steeply the chance of the right value rises with ability, in logits a standard deviation. */
const STEEPNESS = 1.3;

/** Whether what was written meets a key: equal to it, or rounded from it to one decimal or more. */
export function meets(written: string, key: Exact): boolean {
  const places = written.split('.')[1]?.length ?? 0;
  return places > 0 && isRounding(decimal(written), key, places, false);
}

/**
 * A paper of twelve ordinary items read by script: facilities 0.3 to 0.9, ability normal; of the wrong answers 8 % are blank, 12 %
 * another number, the rest slips with shares as 1, 1/2, 1/3 in the order of the catalogue, each times a log-normal factor; one in ten has one decimal.
 */
export function simulatedPaper(seed: number, scripts: number, isPlanted: boolean): SimulatedPaper {
  const random = randomFrom('simulated paper', seed);
  const chosen = drawn(ordinaryItems, ITEMS, random);
  const planted = isPlanted ? chosen.findIndex((item) => plantable(item).length > 0) : -1;
  const items = chosen.map((item, at): SimulatedItem => {
    const key = at === planted ? random.pick(plantable(item)).value : item.key;
    return { item, key, isPlanted: at === planted, facility: random.between(0.3, 0.9), slips: item.slips.map(({ weight, choice }) => ({ weight: weight * Math.exp(SPREAD * random.normal()), choice })) };
  });
  const hardness = items.map(({ facility }) => hardnessFor(facility));
  return {
    items,
    scripts: Array.from({ length: scripts }, () => {
      const ability = random.normal();
      return items.map(({ item, slips }, at) => (random.chance(rightChance(ability, hardness[at] ?? 0)) ? written(item.key, random) : wrongAnswer(slips, random)));
    }),
  };
}

/** Another convention's values that are no rounding of what candidates would write. */
const plantable = ({ key, conventions }: OrdinaryItem): readonly WrongValue[] => conventions.filter(({ value }) => !meets(toDecimals(key, 2), value));

const rightChance = (ability: number, hardness: number): number => 1 / (1 + Math.exp(-STEEPNESS * ability + hardness));

/** The hardness at which so many have it right, over abilities spread as the normal distribution. */
function hardnessFor(facility: number): number {
  const abilities = Array.from({ length: 121 }, (_, at) => (at - 60) / 20);
  const weights = abilities.map((ability) => Math.exp((-ability * ability) / 2));
  const mean = (hardness: number): number =>
    abilities.reduce((sum, ability, at) => sum + (weights[at] ?? 0) * rightChance(ability, hardness), 0) / weights.reduce((sum, weight) => sum + weight, 0);
  let [low, high] = [-8, 8];
  for (let step = 0; step < 40; step += 1) {
    const middle = (low + high) / 2;
    if (mean(middle) > facility) low = middle;
    else high = middle;
  }
  return low;
}

const written = (value: Exact, random: Random): string => toDecimals(value, random.chance(ONE_DECIMAL) ? 1 : 2);

function wrongAnswer(slips: readonly Weighted[], random: Random): string | null {
  if (random.chance(BLANKS)) return null;
  if (slips.length > 0 && !random.chance(OTHER_NUMBERS)) return written(random.pickWeighted(slips), random);
  return `${random.whole(0, 29)}.${random.whole(0, 9)}${random.pick(['0', '5'])}`;
}

function drawn<T>(from: readonly T[], count: number, random: Random): T[] {
  const left = [...from];
  return Array.from({ length: count }, () => left.splice(random.whole(0, left.length - 1), 1)[0]).filter((one) => one !== undefined);
}
