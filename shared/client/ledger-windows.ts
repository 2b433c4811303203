/** Rows fetched at once. */
export const windowRows = 100;

export interface Rows {
  readonly from: number;
  readonly to: number;
}

/** The windows, beside the first, that hold the rows of all ranges; what lies between two ranges is not fetched. */
export function windowsFor(ranges: readonly Rows[]): number[] {
  const windows = new Set<number>();
  for (const { from, to } of ranges) {
    for (let index = Math.floor(Math.max(0, from) / windowRows); index <= Math.floor(Math.max(0, from, to) / windowRows); index += 1) windows.add(index);
  }
  windows.delete(0);
  return [...windows].sort((one, other) => one - other);
}
