import { eq } from 'drizzle-orm';
import * as tables from '../../db/schema';
import type { Answer } from './evidence';
import type { TestServer } from './test-server';

/** Has the ink of every box judged blank, but that of the candidates named as writing. */
export function judgeInk({ context: { db } }: TestServer, answers: readonly Answer[], writing: readonly string[] = []): void {
  for (const { id, candidate } of answers) {
    db.update(tables.crop).set({ ink: writing.includes(candidate) ? 'written' : 'blank' }).where(eq(tables.crop.answer, id)).run();
  }
}

/** As if one side of the frame had been hidden on the scan. */
export const doubtFrame = ({ context: { db } }: TestServer, answerId: string): void =>
  void db.update(tables.crop).set({ evidence: 'doubtful', sidesConfirmed: 3 }).where(eq(tables.crop.answer, answerId)).run();
