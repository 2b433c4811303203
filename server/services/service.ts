import { touchDatabase } from '../../db/queries/service';
import type { Context } from '../context';
import { AppError } from '../errors';

/** Throws not_ready unless the database answers. */
export function assertReady({ db }: Pick<Context, 'db'>): void {
  try {
    touchDatabase(db);
  } catch {
    throw new AppError('not_ready', 'The database does not answer yet.');
  }
}
