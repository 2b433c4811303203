import { countStripsToRead, bindingsOf, missingPages, scriptSheets, typistsOf } from '../../../db/queries/people-and-paper';
import { candidateStandings } from '../../../db/queries/candidates';
import type { Database } from '../../../db/client';
import type { NumberDiffers, PeopleAndPaper } from '../../../shared/contracts/people-and-paper';
import type { Actor } from '../../auth/access';
import type { Context } from '../../context';
import { pictureVersion } from '../picture-version';
import { requireSitting } from '../sitting-access';

type Sheet = ReturnType<typeof scriptSheets>[number];
type Named = Sheet & { readonly candidateId: string; readonly candidateNumber: string };

const away = new Set(['absent', 'withdrawn', 'deferred']);

/** Candidate numbers as people write them: case, spaces and dashes say nothing. */
export const plainNumber = (number: string): string => number.replace(/[\s\-–—./]/g, '').toUpperCase();

const sheetOf = ({ scriptId, scriptNumber, candidateId, candidateNumber, pagesIn, pages }: Sheet) => ({ scriptId, scriptNumber, candidateId, candidateNumber, pagesIn, pages });

const isNamed = (sheet: Sheet): sheet is Named => sheet.candidateId !== null && sheet.candidateNumber !== null;

type NumberState = 'none' | 'unread' | 'unwritten' | 'agrees' | 'settled' | 'differs';

function numberState(sheet: Sheet): NumberState {
  if (sheet.stripImage === null) return 'none';
  if (sheet.readingId === null) return 'unread';
  if (sheet.isSettled) return 'settled';
  if (sheet.read === null) return 'unwritten';
  return sheet.candidateNumber !== null && plainNumber(sheet.read) === plainNumber(sheet.candidateNumber) ? 'agrees' : 'differs';
}

/** Who has the number that stands on a sheet, and whether that person's sheet has the number of this one. */
function differsView(sheet: Named, byNumber: ReadonlyMap<string, Named>, standings: ReadonlyMap<string, { id: string; number: string }>): NumberDiffers {
  const read = sheet.read === null ? null : plainNumber(sheet.read);
  const claimant = read === null ? undefined : standings.get(read);
  const theirs = claimant && byNumber.get(plainNumber(claimant.number));
  return {
    ...sheetOf(sheet),
    read: sheet.read,
    version: pictureVersion(sheet.stripBlob ?? ''),
    claimed: claimant ? { candidateId: claimant.id, candidateNumber: claimant.number, scriptId: theirs?.scriptId ?? null, pagesIn: theirs?.pagesIn ?? 0 } : null,
    isExchange: theirs?.read !== null && theirs?.read !== undefined && plainNumber(theirs.read) === plainNumber(sheet.candidateNumber),
  };
}

function missingOf(db: Database, sittingId: string, sheets: readonly Named[]): PeopleAndPaper['missing'] {
  const missing = new Map<string, number[]>();
  for (const { script, pageNo } of missingPages(db, sittingId)) missing.set(script, [...(missing.get(script) ?? []), pageNo]);
  return sheets.flatMap((sheet) => {
    const pageNos = missing.get(sheet.scriptId) ?? [];
    return sheet.pagesIn > 0 && pageNos.length > 0 && !away.has(sheet.attendance ?? '') ? [{ ...sheetOf(sheet), pageNos }] : [];
  });
}

function byHandOf(db: Database, sheets: readonly Named[]): PeopleAndPaper['byHand'] {
  const byHand = sheets.filter(({ origin }) => origin === 'by-hand');
  const typed = typistsOf(db, byHand.map(({ scriptId }) => scriptId));
  return byHand.map(({ scriptId, candidateNumber }) => ({ scriptId, candidateNumber, typed: typed.filter(({ script }) => script === scriptId).length, wanted: 2 }));
}

/** Whether every sheet is with its candidate, and what is to be done where it is not. */
export function viewOf({ db }: Pick<Context, 'db'>, sittingId: string): PeopleAndPaper {
  const sheets = scriptSheets(db, sittingId);
  const named = sheets.filter(isNamed);
  const candidates = candidateStandings(db, sittingId);
  const standings = new Map(candidates.map(({ id, number }) => [plainNumber(number), { id, number }]));
  const byNumber = new Map(named.map((sheet) => [plainNumber(sheet.candidateNumber), sheet]));
  const states = sheets.map((sheet) => ({ sheet, state: numberState(sheet) }));
  const countOf = (wanted: NumberState): number => states.filter(({ state }) => state === wanted).length;
  const scriptOf = new Map(named.map(({ candidateId, scriptId, origin }) => [candidateId, { scriptId, origin }]));
  return {
    numbers: { unread: countStripsToRead(db, sittingId), agree: countOf('agrees'), settled: countOf('settled') },
    differ: states.flatMap(({ sheet, state }) => (state === 'differs' && isNamed(sheet) ? [differsView(sheet, byNumber, standings)] : [])),
    unwritten: states.flatMap(({ sheet, state }) => (state === 'unwritten' && isNamed(sheet) ? [sheetOf(sheet)] : [])),
    spares: sheets.flatMap((sheet) => (sheet.candidateId === null && sheet.pagesIn > 0 ? [{ ...sheetOf(sheet), read: sheet.read, version: sheet.stripBlob === null ? null : pictureVersion(sheet.stripBlob) }] : [])),
    without: candidates.flatMap(({ id, number, attendance, pagesIn }) => (pagesIn === 0 && !away.has(attendance) && scriptOf.get(id)?.origin !== 'by-hand' ? [{ candidateId: id, candidateNumber: number, attendance, scriptId: scriptOf.get(id)?.scriptId ?? null }] : [])),
    missing: missingOf(db, sittingId, named),
    unexpected: named.flatMap((sheet) => (sheet.pagesIn > 0 && away.has(sheet.attendance ?? '') ? [{ ...sheetOf(sheet), attendance: sheet.attendance ?? '' }] : [])),
    byHand: byHandOf(db, named),
    traces: bindingsOf(db, sittingId),
  };
}

export function peopleAndPaper(context: Context, actor: Actor, sittingId: string): PeopleAndPaper {
  requireSitting(context, actor, sittingId, ['lead', 'external']);
  return viewOf(context, sittingId);
}
