import { deskItems } from '../../db/queries/desk';
import { heldOffsets, ledgerCounts, ledgerRows, readingsOfAnswers, uncoveredBy, type LedgerQuestion } from '../../db/queries/ledger';
import { answerStates, heldStates } from '../../shared/contracts/enums';
import type { LedgerChip } from '../../shared/contracts/enums';
import type { getLedger, LedgerRow } from '../../shared/contracts/ledger';
import type { QueryOf, ResponseOf } from '../../shared/contracts/route';
import { reasonInWords } from '../../shared/marking/reasons';
import { scaleOf } from '../../shared/marking/scale';
import type { ItemScheme } from '../../shared/marking/scheme';
import { itemLabel } from '../../shared/marking/item-label';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { isCovered, shownGiven } from './covers';
import { requireLockedPaper, requireSitting } from './sitting-access';

type Row = ReturnType<typeof ledgerRows>[number];
type Reading = ReturnType<typeof readingsOfAnswers>[number];

const held = new Set<string>(heldStates);

/** Two readings that are uncovered, agree in value and form, and differ in what was struck. */
const differsInMethodOnly = (readings: readonly Reading[]): boolean => {
  const [first, ...others] = readings;
  return first !== undefined && others.length > 0 && others.every(({ canonical }) => canonical === first.canonical) && others.some(({ method }) => method !== first.method);
};

/** Short words for the Why column. */
function whyOf(row: Row, readings: readonly Reading[], covered: boolean): string {
  if (row.state === 'discordant' && !covered && differsInMethodOnly(readings)) return 'only the method marks differ';
  if (row.state === 'ruled' && row.waitsFor !== null) return `ruled, waits for item ${row.waitsFor}`;
  if (row.state === 'ruled') return row.rule && row.numbers ? `ruled, ${reasonInWords({ grains: row.grains, rule: row.rule, numbers: row.numbers }).head}` : 'a mark ruled by hand';
  if (row.state === 'one-reading' && row.readingsDue > 0) return 'another reading is due';
  if (row.waitsFor !== null) return `waits for item ${row.waitsFor}`;
  return row.rule && row.numbers ? reasonInWords({ grains: row.grains, rule: row.rule, numbers: row.numbers }).head : '';
}

function rowView(row: Row, readings: readonly Reading[], uncovered: boolean, scheme: { body: ItemScheme; label: string }): LedgerRow {
  const covered = isCovered(row.state, row.readingsDue, uncovered);
  const isNumeric = scheme.body.kind === 'numeric';
  const { key, lo, hi } = scaleOf(scheme.body);
  return {
    answerId: row.answerId,
    candidateNumber: row.candidateNumber ?? '',
    itemNumber: row.itemNumber,
    label: scheme.label,
    state: row.state,
    isCovered: covered,
    readingsDue: row.readingsDue,
    readings: readings.map((reading) => shownGiven(reading, row.state, covered)),
    value: isNumeric ? row.sortValue : null,
    key: isNumeric ? key.at : null,
    span: Math.max(key.at - lo, hi - key.at),
    why: whyOf(row, readings, covered),
    waitsFor: row.waitsFor,
    grains: row.grains,
    maxGrains: row.maxGrains,
    isRuled: row.state === 'ruled',
    rev: row.rev,
  };
}

function byAnswer(readings: readonly Reading[]): Map<string, Reading[]> {
  const groups = new Map<string, Reading[]>();
  for (const reading of readings) {
    const group = groups.get(reading.answer);
    if (group) group.push(reading);
    else groups.set(reading.answer, [reading]);
  }
  return groups;
}

function countsByChip(rows: ReturnType<typeof ledgerCounts>): Record<LedgerChip, number> {
  const counts = Object.fromEntries([...answerStates.map((state) => [state, 0]), ['all', 0], ['to-rule', 0]]) as Record<LedgerChip, number>;
  for (const { state, n } of rows) {
    counts[state] += n;
    counts.all += n;
    if (held.has(state)) counts['to-rule'] += n;
  }
  return counts;
}

/** A window of the ledger as this person may see it: what is covered leaks by no column, search or order. */
export function ledger(context: Context, actor: Actor, sittingId: string, query: QueryOf<typeof getLedger>): ResponseOf<typeof getLedger> {
  const { db } = context;
  const { sitting } = requireSitting(context, actor, sittingId, ['lead', 'external']);
  requireLockedPaper(context, sitting);
  const schemeVersion = sitting.schemeVersion ?? '';
  const question: LedgerQuestion = { sitting: sittingId, show: query.show, item: query.item, find: query.find, sort: query.sort, direction: query.direction };
  const schemes = new Map(deskItems(db, schemeVersion).map(({ id, number, body }) => [id, { number, body, label: itemLabel(body) }]));
  const counts = countsByChip(ledgerCounts(db, question));
  const rows = ledgerRows(db, question, query.offset, query.limit);
  const ids = rows.map((row) => row.answerId);
  const uncovered = uncoveredBy(db, actor.personId, ids);
  const readings = byAnswer(readingsOfAnswers(db, ids));
  return {
    asOf: sitting.seq,
    total: counts[query.show],
    counts,
    heldOffsets: heldOffsets(db, question),
    items: [...schemes].map(([id, { number, label }]) => ({ id, number, label })),
    rows: rows.flatMap((row) => {
      const scheme = schemes.get(row.itemId);
      return scheme ? [rowView(row, readings.get(row.answerId) ?? [], uncovered.has(row.answerId), scheme)] : [];
    }),
  };
}
