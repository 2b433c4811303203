import type { Hand } from '../truth/hands';
import type { Random } from '../truth/random';
import type { WrittenAnswer } from '../truth/written';
import { handwritten, inkSvg, joined, penLine } from './handwriting';
import type { Ink, Stroke } from './handwriting';
import { placeOfItem } from './sheet-layout';
import type { ItemPlace, SheetBox } from './sheet-layout';

interface Place {
  readonly x: number;
  readonly baseline: number;
  readonly digitMm: number;
  readonly maxWidth: number;
}

interface Placed extends Ink {
  readonly x: number;
  readonly baseline: number;
  readonly width: number;
}

/** Everything a candidate wrote for one item: the working on its lines and the answer in its box. */
export function answerInk(answer: WrittenAnswer, hand: Hand, random: Random, { answer: box, lines, working }: ItemPlace = placeOfItem(answer.itemNumber)): string {
  const stroke = { hand, random };
  const pressure = random.between(0.86, 1) * (hand.pen === 'pencil' ? 0.9 : 1);
  const ink = joined([workingInk(stroke, answer.working, lines, working), boxInk(stroke, answer, box)]);
  return inkSvg(ink, hand, answer.isFaint ? pressure * FAINT : pressure);
}

const FAINT = 0.3;

const noInk: Ink = { shapes: '', lines: '' };

function workingInk(stroke: Stroke, working: readonly string[], lines: readonly number[], box: SheetBox): Ink {
  const { hand, random } = stroke;
  const digitMm = Math.min(3.5, 2.1 + hand.digitMm * 0.17);
  const indent = random.between(2, 9);
  return joined(
    working.slice(0, lines.length).map((text, index) => {
      const line = lines[index] ?? 0;
      const x = box.x + indent + random.between(-0.9, 0.9) + (index > 0 && text.startsWith('=') ? 1.5 : 0);
      const baseline = line - random.between(0.5, 1.1);
      return handwritten(stroke, { text, x, baseline, digitMm, maxWidth: box.x + box.w - x - 2 });
    }),
  );
}

function boxInk(stroke: Stroke, answer: WrittenAnswer, box: SheetBox): Ink {
  switch (answer.kind) {
    case 'blank':
      return noInk;
    case 'value':
      return answer.struck === undefined
        ? put(stroke, drawnText(answer), somewhere(stroke, box))
        : replaced(stroke, answer.struck, drawnText(answer), box);
    case 'crossed-out': {
      const ink = put(stroke, answer.text, somewhere(stroke, box));
      return joined([ink, crossing(stroke, ink)]);
    }
    case 'two-answers':
      return twoAnswers(stroke, answer.text, answer.second ?? answer.text, box);
    case 'cannot-read':
      return muddle(stroke, answer.text, box);
    case 'elsewhere':
      return put(stroke, answer.text, { ...somewhere(stroke, box), x: box.x + 5, digitMm: 4.4, maxWidth: box.w - 9 });
  }
}

/** The text with its one unclear figure in braces: 3.10 that may be 3.70 is drawn from 3.{1/7}0. */
function drawnText({ text, unclear }: WrittenAnswer): string {
  if (!unclear) return text;
  const [asRead, alsoPossible] = unclear;
  return [...asRead]
    .map((figure, index) => {
      const other = alsoPossible[index] ?? figure;
      return figure === other ? figure : `{${[figure, other].sort().join('/')}}`;
    })
    .join('');
}

const put = (stroke: Stroke, text: string, place: Place): Placed => ({
  ...handwritten(stroke, { text, ...place }),
  x: place.x,
  baseline: place.baseline,
});

function somewhere({ hand, random }: Stroke, box: SheetBox): Place {
  const digitMm = hand.digitMm * random.between(0.93, 1.06);
  const x = box.x + random.between(5, 17);
  return {
    x,
    digitMm,
    baseline: box.y + (box.h + digitMm) / 2 + random.between(-1.6, 1.8),
    maxWidth: box.x + box.w - x - 4,
  };
}

/** The first value goes small to the left, crossed out; the one that counts beside it. */
function replaced(stroke: Stroke, struck: string, text: string, box: SheetBox): Ink {
  const place = somewhere(stroke, box);
  const first = put(stroke, struck, { ...place, x: box.x + 4.5, digitMm: place.digitMm * 0.82, maxWidth: box.w * 0.42 });
  const next = first.x + first.width + stroke.random.between(4, 7);
  const second = put(stroke, text, {
    ...place,
    x: next,
    baseline: place.baseline + stroke.random.between(-1, 1.2),
    maxWidth: box.x + box.w - next - 3,
  });
  return joined([first, crossing(stroke, first), second]);
}

function twoAnswers(stroke: Stroke, text: string, second: string, box: SheetBox): Ink {
  const place = somewhere(stroke, box);
  if (stroke.random.chance(0.5)) {
    const digitMm = Math.min(place.digitMm, 6.2);
    return put(stroke, `${text} or ${second}`, { ...place, x: box.x + 4, digitMm, maxWidth: box.w - 8 });
  }
  const digitMm = Math.min(place.digitMm * 0.8, 5.6);
  const above = put(stroke, text, { ...place, digitMm, baseline: box.y + 1.8 + digitMm });
  const below = put(stroke, second, { ...place, x: place.x + 3, digitMm, baseline: box.y + box.h - 2.4 });
  return joined([above, below]);
}

/** One or two lines through, or a zigzag over all of it. */
function crossing(stroke: Stroke, { x, baseline, width }: Placed): Ink {
  const { random, hand } = stroke;
  const height = hand.digitMm * 0.85;
  const style = random.pick(['line', 'lines', 'zigzag'] as const);
  const wobble = (): number => random.normal() * 0.35;
  if (style === 'zigzag') {
    const turns = Math.max(6, Math.round(width / 2.1));
    const points = Array.from({ length: turns }, (_, index) => ({
      x: x - 1 + ((width + 2) * index) / (turns - 1) + wobble(),
      y: baseline - height * (index % 2 === 0 ? 0.06 : 0.96) + wobble(),
    }));
    return penLine(points);
  }
  const through = (level: number): Ink =>
    penLine([
      { x: x - 1.8, y: baseline - height * (level - 0.08) + wobble() },
      { x: x + width * 0.5, y: baseline - height * level + wobble() },
      { x: x + width + 1.6, y: baseline - height * (level + 0.1) + wobble() },
    ]);
  return style === 'line' ? through(0.5) : joined([through(0.38), through(0.64)]);
}

/** Figures written over figures and scrubbed: ink, but no value to be had from it. */
function muddle(stroke: Stroke, text: string, box: SheetBox): Ink {
  const place = somewhere(stroke, box);
  const first = put(stroke, text, place);
  const over = [...text].reverse().join('').replace('.', '8');
  const second = put(stroke, over, { ...place, x: place.x + 0.9, baseline: place.baseline + 0.7 });
  const { random, hand } = stroke;
  const loops = Array.from({ length: 40 }, (_, index) => ({
    x: first.x + ((first.width + 3) * index) / 39 + Math.cos(index * 1.7) * 2.4 + random.normal() * 0.5,
    y: place.baseline - hand.digitMm * (0.48 + 0.4 * Math.sin(index * 1.7) + random.normal() * 0.07),
  }));
  return joined([first, second, penLine(loops)]);
}
