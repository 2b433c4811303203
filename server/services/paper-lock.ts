import { v7 as uuidv7 } from 'uuid';
import { inTransaction } from '../../db/client';
import { updateSitting } from '../../db/queries/courses';
import { findLayout } from '../../db/queries/layouts';
import { answerBoxCounts, draftedItems, insertPaperLock, insertSchemeVersion, insertSchemeVersionItem } from '../../db/queries/papers';
import type { Database } from '../../db/client';
import { linkProblem } from '../../shared/marking/links';
import { schemeProblems } from '../../shared/marking/scheme-checks';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { conflict, invalidRequest } from '../errors';
import { recordAct } from './audit';
import { ensureScripts } from './scripts';
import { storeScheme } from './schemes';
import { bumpSitting, requireOpenPaper, requireSitting } from './sitting-access';

export interface LockedPaper {
  readonly lockedAt: number;
  readonly schemeOrdinal: number;
  readonly scripts: number;
  readonly answers: number;
}

/** What still keeps a paper from being locked, by item. */
function lockProblems(db: Database, sittingId: string, isForPrinting: boolean): Record<string, string> {
  const items = draftedItems(db, sittingId);
  if (items.length === 0) return { items: 'The paper has no item yet.' };
  const boxes = answerBoxCounts(db, sittingId, 1);
  const paper = items.map(({ item, scheme }) => ({ id: item.id, number: item.number, scheme }));
  const problems: Record<string, string> = {};
  for (const { item, scheme } of items) {
    const [wrong] = schemeProblems(scheme);
    const link = linkProblem({ id: item.id, number: item.number, scheme }, paper);
    if (link) problems[`items.${item.number}`] = `Item ${item.number}: ${link}`;
    else if (wrong) problems[`items.${item.number}`] = `Item ${item.number}: ${wrong.message}`;
    else if (!isForPrinting && boxes.get(item.id) !== 1) problems[`items.${item.number}`] = `Item ${item.number} has no answer box on a page.`;
  }
  return problems;
}

/**
 * Freezes paper and layout: the first scheme version is made of the drafts, and everyone on the class list gets a script with
 * its pages and answers. From here on the scheme changes by amendment only. For printed sheets nothing needs to be drawn.
 */
export function lockPaper(context: Context, actor: Actor, sittingId: string, isForPrinting = false): LockedPaper {
  const { db, clock } = context;
  requireSitting(context, actor, sittingId, ['lead']);
  return inTransaction(db, () => {
    const { sitting } = requireSitting(context, actor, sittingId, ['lead']);
    requireOpenPaper(context, sitting);
    const problems = lockProblems(db, sittingId, isForPrinting);
    const [first] = Object.values(problems);
    if (first !== undefined) throw invalidRequest(first, problems);
    if (!isForPrinting && !findLayout(db, sittingId, 1)) throw conflict('The paper has no layout yet.');
    const version = uuidv7();
    const lockedAt = clock.now();
    insertSchemeVersion(db, { id: version, sitting: sittingId, ordinal: 1, madeBy: actor.personId, madeAt: lockedAt });
    const schemes = draftedItems(db, sittingId).map(({ item, scheme }) => ({ item: item.id, itemScheme: storeScheme(db, scheme) }));
    for (const scheme of schemes) insertSchemeVersionItem(db, { version, ...scheme });
    insertPaperLock(db, { sitting: sittingId, lockedAt, lockedBy: actor.personId });
    updateSitting(db, sittingId, { schemeVersion: version });
    const made = ensureScripts(context, sittingId);
    bumpSitting(db, sittingId);
    recordAct(context, { actor: actor.personId, act: 'paper-locked', sitting: sittingId, subject: sittingId, after: { version, schemes, ...made } });
    return { lockedAt, schemeOrdinal: 1, ...made };
  });
}
