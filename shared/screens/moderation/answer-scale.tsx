import type { AnswerView } from '../../contracts/ledger';
import { readTyped, type AnswerForm } from '../../marking/read-typed';
import type { ScaleData } from '../../marking/scale';
import { toApproximate } from '../../chemistry/exact';
import { Scale } from '../../ui/scale';
import { drawnScale } from '../drawn-scale';
import { words } from './words';

/** Where a text stands on the scale; null for a code or what is kept back. Only drawn, never decided by. */
function placeOf(text: string | null | undefined, form: AnswerForm): number | null {
  if (!text) return null;
  const read = readTyped(text, form);
  return read.ok ? toApproximate(read.value) : null;
}

/** The scale of the item with the readings under it and the distance between them; the own reading as the drop. Printed numbers have none. */
export function AnswerScale({ answer }: { answer: AnswerView }) {
  const data = answer.scheme.scale as ScaleData | null;
  const [first = null, second = null] = answer.readings.map(({ given }) => placeOf(given?.text, answer));
  const mine = placeOf(answer.mine?.text, answer);
  const pair = first !== null && second !== null && answer.gap !== null && first !== second ? { first, second, gap: words.sheet.apart(answer.gap) } : undefined;
  if (data === null) return null;
  const columns = pair === undefined ? [first, second].filter((at): at is number => at !== null).slice(0, 1).map((at) => ({ at, count: 1 })) : undefined;
  return (
    <Scale
      {...drawnScale(data, words.sheet.key(answer.scheme.key))}
      fit="phone"
      pair={pair}
      columns={columns}
      drop={mine}
      dropText={answer.mine?.text ?? ''}
    />
  );
}
