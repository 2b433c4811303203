import { decimal, toFractionText } from '../../shared/chemistry/exact';
import { wrongKeyAlarm, type Alarm, type AlarmLimits, type AlarmReading } from '../../shared/statistics/wrong-key-alarm';
import { meets, type SimulatedItem, type SimulatedPaper } from './simulated-paper';

/** One item of a simulated paper, with the script at which its alarm was first raised. */
export interface ItemAlarm {
  readonly item: SimulatedItem;
  readonly raisedAt: number | null;
  readonly alarm: Alarm | null;
}

/** After every third script up to 60, then after every twelfth: as a service would look after a batch of readings. */
const looks = (scripts: number): number[] => Array.from({ length: scripts }, (_, at) => at + 1).filter((n) => n % (n <= 60 ? 3 : 12) === 0);

/** Every item of a paper, looked at while reading goes on until its alarm is raised. */
export function alarmsOf(paper: SimulatedPaper, limits?: AlarmLimits): readonly ItemAlarm[] {
  const rights = paper.scripts.map((script) => paper.items.map((item, at) => shareOf(script[at] ?? null, item)));
  const columns = paper.items.map((_, at) => readingsOf(paper, rights, at));
  const facilities = new Map(looks(paper.scripts.length).map((n) => [n, columns.map((column) => mean(column.slice(0, n).map(({ share }) => share)))]));
  return paper.items.map((item, at) => {
    const readings = columns[at] ?? [];
    for (const [n, all] of facilities) {
      const otherFacilities = all.filter((_, other) => other !== at);
      const alarm = wrongKeyAlarm({ readings: readings.slice(0, n), otherFacilities }, limits);
      if (alarm.isRaised) return { item, raisedAt: n, alarm };
    }
    return { item, raisedAt: null, alarm: null };
  });
}

function readingsOf(paper: SimulatedPaper, rights: readonly (readonly number[])[], at: number): readonly AlarmReading[] {
  const simulated = paper.items[at];
  if (!simulated) return [];
  const { item, key } = simulated;
  const known = new Map<string, Pick<AlarmReading, 'reading' | 'meetsKey' | 'convention'>>();
  const named = [{ id: 'slater', value: item.key }, ...item.conventions];
  return paper.scripts.map((script, candidate) => {
    const text = script[at] ?? null;
    if (text !== null && !known.has(text)) {
      known.set(text, { reading: toFractionText(decimal(text)), meetsKey: meets(text, key), convention: named.find(({ value }) => meets(text, value))?.id ?? null });
    }
    const what = (text !== null && known.get(text)) || { reading: 'blank', meetsKey: false, convention: null };
    const rest = mean((rights[candidate] ?? []).filter((_, place) => place !== at));
    return { ...what, share: what.meetsKey ? 1 : 0, rest };
  });
}

const shareOf = (text: string | null, { key }: SimulatedItem): number => (text !== null && meets(text, key) ? 1 : 0);
const mean = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;
