import { inTransaction } from '../../db/client';
import { updateSitting } from '../../db/queries/courses';
import type { QtiReading } from '../../shared/contracts/paper-file';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { invalidRequest } from '../errors';
import { paperMarkOf, replaceItems, requireSeenPaper } from './paper-file';
import { readPackage } from './qti-in/read-package';
import { requireOpenPaper, requireSitting } from './sitting-access';

/** What a package would bring, and the mark of the paper that would give way. */
export function previewQti(context: Context, actor: Actor, sittingId: string, bytes: Uint8Array): QtiReading & { mark: string } {
  const { sitting } = requireSitting(context, actor, sittingId, ['lead']);
  requireOpenPaper(context, sitting);
  return { ...readPackage(bytes).reading, mark: paperMarkOf(context, sittingId, sitting.title) };
}

interface Sent {
  readonly bytes: Uint8Array;
  /** Whether the rest is taken where some items are refused. */
  readonly takesRest: boolean;
}

/** Replaces the items of an open paper by those of a package, all or nothing unless the rest is asked for; keys are worked here. */
export function takeQti(context: Context, actor: Actor, sittingId: string, mark: string, { bytes, takesRest }: Sent): QtiReading {
  requireSeenPaper(context, actor, sittingId, mark);
  const { reading, items } = readPackage(bytes);
  const [first] = reading.refused;
  if (first && !takesRest) throw invalidRequest(`${first.file}: ${first.message}`, Object.fromEntries(reading.refused.map(({ file, message }) => [file, message])));
  if (items.length === 0) throw invalidRequest('Nothing in the package can be taken. The paper stays as it is.');
  inTransaction(context.db, () => {
    requireSeenPaper(context, actor, sittingId, mark);
    replaceItems(context, actor, sittingId, items);
    updateSitting(context.db, sittingId, {});
  });
  return reading;
}
