/** The place in a list that a row has been dragged to: past a neighbour once more than half of that neighbour is behind. */
export function droppedAt(heights: readonly number[], from: number, by: number): number {
  const step = Math.sign(by);
  let left = Math.abs(by);
  let at = from;
  while (step !== 0) {
    const next = heights[at + step];
    if (next === undefined || left < next / 2) break;
    left -= next;
    at += step;
  }
  return at;
}
