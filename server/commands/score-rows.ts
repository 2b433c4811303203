import { paperFile } from '../../shared/contracts/paper-file';
import { marksText } from '../../shared/marking/grains';
import { completeScheme } from '../../shared/marking/complete-scheme';
import type { LinkedItem } from '../../shared/marking/links';
import { markPaper, type SettledAnswer, type VerdictMemo } from '../../shared/marking/mark-paper';
import { readTyped } from '../../shared/marking/read-typed';
import { codes, type Given, type ItemScheme } from '../../shared/marking/scheme';
import { fileItemId, readFileItems } from '../services/drafts/file-items';
import type { Row } from './key-rows';

/** The schemes of a paper file, in its order. Throws one sentence for each item that cannot be worked. */
export function schemesOf(json: string): readonly ItemScheme[] {
  const file = paperFile.safeParse(JSON.parse(json));
  if (!file.success) throw new Error(file.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`).join('\n'));
  const { schemes, refusals, problems } = readFileItems(file.data.items);
  const wrong = [...refusals, ...problems];
  if (wrong.length > 0) throw new Error(wrong.map(({ place, path, message }) => `Item ${place}, ${path}: ${message}`).join('\n'));
  return schemes;
}

/** `@blank` is the code blank; anything else is a text as it was typed. */
function givenBy(text: string): Given | string {
  if (!text.startsWith('@')) return { text };
  const code = codes.find((known) => `@${known}` === text);
  return code ? { code } : `text: “${text}” is no code. Codes: ${codes.map((known) => `@${known}`).join(', ')}.`;
}

interface ReadRow {
  readonly row: Row;
  readonly item: LinkedItem | undefined;
  readonly answer: SettledAnswer | null;
  readonly parsed: string;
  readonly error: string;
}

function readRow(items: readonly LinkedItem[], row: Row): ReadRow {
  const { item: place = '', text = '' } = row;
  const item = items.find(({ id }) => id === place.trim());
  const refused = (error: string): ReadRow => ({ row, item, answer: null, parsed: '', error });
  if (!item) return refused(`item: the paper has no item ${place}.`);
  const given = givenBy(text);
  if (typeof given === 'string') return refused(given);
  const struck = (row.method ?? '').split(';').map((id) => id.trim()).filter((id) => id !== '');
  const unknown = struck.find((id) => !completeScheme(item.scheme).methodMarks.some((mark) => mark.id === id));
  if (unknown !== undefined) return refused(`method: item ${place} has no method mark “${unknown}”.`);
  if ('code' in given) return { row, item, answer: { given, struck }, parsed: '', error: '' };
  const read = readTyped(given.text, item.scheme);
  if (!read.ok) return refused(`text: ${read.unfinished ? 'not yet a value.' : read.message}`);
  return { row, item, answer: { given, struck }, parsed: read.canonical, error: '' };
}

/** One candidate's rows marked as one paper. Of several rows for an item each is marked, and the last is what others follow from. */
function markCandidate(items: readonly LinkedItem[], rows: readonly ReadRow[], memo: VerdictMemo): Row[] {
  const standing = new Map<string, SettledAnswer>();
  for (const { item, answer } of rows) if (item && answer) standing.set(item.id, answer);
  return rows.map(({ row: { candidate = '', item: place = '', text = '' }, item, answer, parsed, error }) => {
    const own = { candidate, item: place, text, parsed, max: item ? marksText(item.scheme.maxGrains) : '' };
    const mark = item && answer ? markPaper(items, new Map(standing).set(item.id, answer), memo).get(item.id) : undefined;
    if (!mark) return { ...own, mark: '', rule: '', slips: '', error };
    const { verdict, waits } = mark;
    const isOpen = verdict.grains === null || waits;
    return { ...own, mark: isOpen ? '' : marksText(verdict.grains ?? 0), rule: waits ? 'waits' : verdict.rule, slips: verdict.numbers.slips ?? '', error: '' };
  });
}

/** Rows marked, in their order: each candidate's as one paper, so that what follows from an earlier item is followed. */
export function scoreRows(schemes: readonly ItemScheme[], rows: readonly Row[]): Row[] {
  const items = schemes.map((scheme, index): LinkedItem => ({ id: fileItemId(index + 1), number: index + 1, scheme }));
  const byCandidate = new Map<string, number[]>();
  rows.forEach(({ candidate = '' }, index) => byCandidate.set(candidate, [...(byCandidate.get(candidate) ?? []), index]));
  const memo: VerdictMemo = new Map();
  const read = rows.map((row) => readRow(items, row));
  const scored: Row[] = [];
  for (const places of byCandidate.values()) {
    const marked = markCandidate(items, places.map((place) => read[place]).filter((one) => one !== undefined), memo);
    places.forEach((place, index) => void (scored[place] = marked[index] ?? {}));
  }
  return scored;
}
