import { inTransaction } from '../../../db/client';
import { countStripsToRead, findNumberReading, findScript, findStrip, insertNumberReading, stripsToRead } from '../../../db/queries/people-and-paper';
import type { NumberStrip, readNumber as readContract } from '../../../shared/contracts/people-and-paper';
import type { BodyOf } from '../../../shared/contracts/route';
import type { Actor } from '../../auth/access';
import type { Context } from '../../context';
import { conflict, notFound } from '../../errors';
import { recordAct } from '../audit';
import { pictureVersion } from '../picture-version';
import { bumpSitting, requireSitting } from '../sitting-access';

const readers = ['reader', 'lead'] as const;

/** Hand-written numbers to read. Nothing beside them tells whose sheet it is. */
export function numberStrips(context: Context, actor: Actor, sittingId: string, limit: number): { strips: NumberStrip[]; left: number } {
  const { db } = context;
  requireSitting(context, actor, sittingId, readers);
  const strips = stripsToRead(db, sittingId, limit).map(({ blob, ...strip }) => ({ ...strip, version: pictureVersion(blob) }));
  return { strips, left: countStripsToRead(db, sittingId) };
}

export function pictureOfStrip(context: Context, actor: Actor, scriptId: string): string {
  const found = findStrip(context.db, scriptId);
  requireSitting(context, actor, findScript(context.db, scriptId)?.sitting, ['lead', 'reader', 'external']);
  if (!found) throw notFound();
  return found.strip.blob;
}

/** Records what a strip says, once; a repeat under the same id is the same reading. */
export function readNumber(context: Context, actor: Actor, id: string, { scriptId, text }: BodyOf<typeof readContract>): void {
  const { db, clock } = context;
  requireSitting(context, actor, findScript(db, scriptId)?.sitting, readers);
  inTransaction(db, () => {
    const strip = findStrip(db, scriptId);
    if (!strip) throw notFound();
    const known = findNumberReading(db, id);
    if (known) {
      if (known.reader !== actor.personId) throw notFound();
      if (known.script !== scriptId || known.text !== text) throw conflict('Another reading was stored under this id. Yours was not stored.');
      return;
    }
    insertNumberReading(db, { id, script: scriptId, pageImage: strip.strip.pageImage, reader: actor.personId, text, at: clock.now() });
    bumpSitting(db, strip.sitting);
    recordAct(context, { actor: actor.personId, act: 'number-read', sitting: strip.sitting, subject: scriptId, after: { reading: id } });
  });
}
