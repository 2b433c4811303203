import { smallestBoxMm, type SentBox, type SentLayout } from '../../shared/contracts/layouts';

/** Coordinates come from a drawing: a hundredth of a millimetre past the edge is still the edge. */
const slackMm = 0.01;

type Page = SentLayout['pages'][number];

function placeProblem(box: SentBox, page: Page | undefined): string | null {
  if (!page) return `there is no page ${box.pageNo}.`;
  if (box.w < smallestBoxMm || box.h < smallestBoxMm) return `a box is at least ${smallestBoxMm} mm wide and high.`;
  const isInside = box.x >= -slackMm && box.y >= -slackMm && box.x + box.w <= page.widthMm + slackMm && box.y + box.h <= page.heightMm + slackMm;
  return isInside ? null : `the box reaches beyond page ${box.pageNo}.`;
}

function itemProblem(box: SentBox, items: ReadonlyMap<string, number>): string | null {
  if (box.use === 'number') return box.item === null ? null : 'the box for the candidate number belongs to no item.';
  if (box.item === null) return 'say to which item the box belongs.';
  return items.has(box.item) ? null : 'the paper has no such item.';
}

/** The box in words: "Item 6, answer box on page 1". */
function nameOf(box: SentBox, items: ReadonlyMap<string, number>): string {
  if (box.use === 'number') return `Box for the candidate number on page ${box.pageNo}`;
  const number = box.item === null ? undefined : items.get(box.item);
  return `${number === undefined ? 'A box without item' : `Item ${number}`}, ${box.use} box on page ${box.pageNo}`;
}

/** What is wrong with boxes, by their place in the list; each sentence names its box. `items` are numbers by id. */
export function boxProblems({ pages, boxes }: SentLayout, items: ReadonlyMap<string, number>): Record<string, string> {
  const problems: Record<string, string> = {};
  const answered = new Set<string>();
  const ids = new Set<string>();
  let hasNumberBox = false;
  boxes.forEach((box, index) => {
    const wrong = itemProblem(box, items) ?? placeProblem(box, pages[box.pageNo - 1]);
    if (wrong) problems[`boxes.${index}`] = `${nameOf(box, items)}: ${wrong}`;
    else if (box.use === 'answer' && box.item !== null && answered.has(box.item)) problems[`boxes.${index}`] = `${nameOf(box, items)}: the item has an answer box already.`;
    else if (box.use === 'number' && hasNumberBox) problems[`boxes.${index}`] = `${nameOf(box, items)}: the paper has one already.`;
    else if (box.id !== undefined && ids.has(box.id)) problems[`boxes.${index}`] = `${nameOf(box, items)}: it was sent twice.`;
    if (box.use === 'answer' && box.item !== null) answered.add(box.item);
    if (box.use === 'number') hasNumberBox = true;
    if (box.id !== undefined) ids.add(box.id);
  });
  return problems;
}
