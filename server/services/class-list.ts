import { createHash } from 'node:crypto';
import { v7 as uuidv7 } from 'uuid';
import { inTransaction, type Database } from '../../db/client';
import { insertCandidate } from '../../db/queries/candidates';
import { namesOfSitting, saveName } from '../../db/queries/names';
import type { ListPreview, ListRow } from '../../shared/contracts/class-list';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { conflict, invalidRequest } from '../errors';
import { readClassList } from '../ingest/class-list';
import { recordAct } from './audit';
import { ensureScripts } from './scripts';
import { bumpSitting, requireSitting } from './sitting-access';

interface PlannedRow extends ListRow {
  /** The candidate who stands on the list already. */
  readonly candidateId: string | null;
}

interface Plan {
  readonly preview: ListPreview;
  readonly rows: readonly PlannedRow[];
}

/** What a text would do to the class list as it stands. A field that the text leaves empty keeps what is known. */
function planOf(db: Database, sittingId: string, text: string): Plan {
  const { candidates, problems } = readClassList(text);
  const known = new Map(namesOfSitting(db, sittingId).map((row) => [row.number.toUpperCase(), row]));
  const rows = candidates.map(({ line, number, name, email }): PlannedRow => {
    const before = known.get(number.toUpperCase());
    const after = { name: name ?? before?.name ?? null, email: email ?? before?.email ?? null };
    const isSame = before !== undefined && after.name === before.name && after.email === before.email;
    return { line, number: before?.number ?? number, ...after, outcome: before === undefined ? 'new' : isSame ? 'unchanged' : 'changed', candidateId: before?.candidateId ?? null };
  });
  const counts = { new: 0, changed: 0, unchanged: 0 };
  for (const { outcome } of rows) counts[outcome] += 1;
  const inText = new Set(candidates.map(({ number }) => number.toUpperCase()));
  const notInText = [...known.keys()].filter((number) => !inText.has(number)).length;
  const hash = problems.length > 0 ? null : createHash('sha256').update(JSON.stringify([text, rows])).digest('hex');
  const errors = [...problems].sort((one, other) => one.line - other.line || one.column - other.column);
  return { rows, preview: { rows: rows.map(({ candidateId: _own, ...row }) => row), errors, notInText, counts, hash } };
}

/** What a class list would do; imports nothing. */
export function previewClassList(context: Context, actor: Actor, sittingId: string, text: string): ListPreview {
  requireSitting(context, actor, sittingId, ['lead']);
  return planOf(context.db, sittingId, text).preview;
}

export interface ImportedList {
  readonly added: number;
  readonly changed: number;
  readonly unchanged: number;
  readonly scripts: number;
}

/**
 * Imports a class list, all of it or nothing; with the hash of a preview only if it would still do what was previewed. On a
 * locked paper the new candidates get their scripts.
 */
export function importClassList(context: Context, actor: Actor, sittingId: string, text: string, previewed?: string): ImportedList {
  const { db } = context;
  requireSitting(context, actor, sittingId, ['lead']);
  return inTransaction(db, () => {
    const { rows, preview } = planOf(db, sittingId, text);
    const [problem] = preview.errors;
    if (problem) throw invalidRequest(`Line ${problem.line}, column ${problem.column}: ${problem.message}`);
    if (previewed !== undefined && previewed !== preview.hash) throw conflict('The class list or the text changed since the preview. Nothing was imported.', preview);
    for (const { outcome, candidateId, number, name, email } of rows) {
      if (outcome === 'unchanged') continue;
      const id = candidateId ?? uuidv7();
      if (candidateId === null) insertCandidate(db, { id, sitting: sittingId, number });
      if (outcome === 'changed' || name !== null || email !== null) saveName(db, { candidate: id, name, email });
    }
    const { scripts } = ensureScripts(context, sittingId);
    const { new: added, changed, unchanged } = preview.counts;
    bumpSitting(db, sittingId);
    const textHash = createHash('sha256').update(text).digest('hex');
    recordAct(context, { actor: actor.personId, act: 'class-list-imported', sitting: sittingId, subject: sittingId, after: { added, changed, unchanged, scripts, textHash } });
    return { added, changed, unchanged, scripts };
  });
}

/** Names by candidate, for the lead and the exams officer. */
export function namesFor(context: Context, actor: Actor, sittingId: string): { candidateId: string; name: string | null; email: string | null }[] {
  requireSitting(context, actor, sittingId, ['lead', 'officer']);
  return namesOfSitting(context.db, sittingId);
}
