import type { Context } from '../context';
import { AppError } from '../errors';

const inGigabytes = (bytes: number): string => `${(bytes / 1024 ** 3).toLocaleString('en-GB', { maximumFractionDigits: 1 })} GB`;

/** Throws unless the disk has room: for the parts and the whole file, or for nothing yet, and something to spare. */
export function requireRoom({ parts, config }: Pick<Context, 'parts' | 'config'>, size: number): void {
  const free = parts.free();
  if (free - size * 2 < config.keepFreeBytes) throw new AppError('no_space', `The disk of the server has ${inGigabytes(free)} left, too little to take ${size > 0 ? 'this file' : 'scans'}. Tell whoever looks after it.`);
}
