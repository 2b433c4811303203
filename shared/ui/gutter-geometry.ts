const closest = 2;

/** Where the ticks of a gutter stand: rows nearer than two pixels to the last tick share it. */
export function gutterTicks(rows: readonly number[], total: number, height: number): number[] {
  if (!(total > 0) || !(height > 0)) return [];
  const ticks: number[] = [];
  for (const row of [...rows].sort((one, other) => one - other)) {
    const place = Math.round(((row + 0.5) / total) * height);
    if (place - (ticks.at(-1) ?? -closest) >= closest) ticks.push(place);
  }
  return ticks;
}

/** The part of the list on view, as pixels of the gutter; never too small to see. */
export function gutterWindow(from: number, to: number, total: number, height: number): { top: number; height: number } {
  if (!(total > 0)) return { top: 0, height: 0 };
  const tall = Math.min(height, Math.max(20, ((to - from) / total) * height));
  return { top: Math.min(height - tall, Math.max(0, (from / total) * height)), height: tall };
}
