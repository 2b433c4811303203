import { eq } from 'drizzle-orm';
import { v7 as uuidv7 } from 'uuid';
import { inTransaction } from '../../db/client';
import * as tables from '../../db/schema';
import { answersOfSitting } from '../../db/queries/settling';
import { settleAnswers } from '../../server/services/settle';
import type { TestServer } from './test-server';

export interface Answer {
  readonly id: string;
  readonly itemId: string;
  readonly candidate: string;
}

/** Gives every answer of a sitting its cut-out, as if all pages had come in, and returns the answers. */
export function giveEvidence(server: TestServer, sittingId: string): Answer[] {
  const { context, people } = server;
  const { db } = context;
  return inTransaction(db, () => {
    const batch = uuidv7();
    const upload = uuidv7();
    const blob = 'e'.repeat(64);
    db.insert(tables.blob).values({ sha256: blob, size: 1, mediaType: 'image/jpeg' }).onConflictDoNothing().run();
    db.insert(tables.batch).values({ id: batch, sitting: sittingId, bundle: 'A', madeBy: people.readerOne, madeAt: 0 }).run();
    db.insert(tables.upload).values({ id: upload, batch, fileName: 'pages.jpg', size: 1, partSize: 1, madeAt: 0 }).run();
    const boxes = new Map(db.select().from(tables.box).all().map((box) => [box.item, box.id]));
    const pages = db.select({ id: tables.page.id, script: tables.page.script }).from(tables.page).innerJoin(tables.script, eq(tables.script.id, tables.page.script)).where(eq(tables.script.sitting, sittingId)).all();
    const images = new Map(
      pages.map((page, index) => {
        const id = uuidv7();
        db.insert(tables.pageImage).values({ id, upload, index, sitting: sittingId, state: 'placed', page: page.id }).run();
        db.update(tables.page).set({ image: id }).where(eq(tables.page.id, page.id)).run();
        return [page.script, id];
      }),
    );
    const answers = db
      .select({ id: tables.answer.id, itemId: tables.answer.item, script: tables.answer.script, candidate: tables.candidate.number })
      .from(tables.answer)
      .innerJoin(tables.script, eq(tables.script.id, tables.answer.script))
      .innerJoin(tables.candidate, eq(tables.candidate.id, tables.script.candidate))
      .where(eq(tables.answer.sitting, sittingId))
      .all();
    for (const answer of answers) {
      const crop = { id: uuidv7(), answer: answer.id, box: boxes.get(answer.itemId) ?? '', pageImage: images.get(answer.script) ?? '', blob, widthPx: 600, heightPx: 180 };
      db.insert(tables.crop).values(crop).run();
    }
    db.update(tables.answer).set({ evidence: 'in' }).where(eq(tables.answer.sitting, sittingId)).run();
    settleAnswers(context, answersOfSitting(db, sittingId));
    return answers.map(({ id, itemId, candidate }) => ({ id, itemId, candidate }));
  });
}
