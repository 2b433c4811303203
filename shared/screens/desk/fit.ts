export interface Size {
  readonly width: number;
  readonly height: number;
}

const most = 3;

/** Side by side at one scale: how much larger than its pixels each is shown, so that all fit the room. */
export function fitBeside(sizes: readonly Size[], room: Size, gap: number): number {
  const width = sizes.reduce((sum, size) => sum + size.width, 0);
  const height = Math.max(...sizes.map((size) => size.height), 1);
  return Math.max(0.05, Math.min(most, (room.width - gap * (sizes.length - 1)) / Math.max(1, width), room.height / height));
}

/** One alone in its room. */
export const fitAlone = (size: Size, room: Size): number => fitBeside([size], room, 0);
