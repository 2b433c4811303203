import { CsvError, parse } from 'csv-parse/sync';

export interface ListedCandidate {
  readonly line: number;
  readonly number: string;
  /** Null where the text says nothing of it. */
  readonly name: string | null;
  readonly email: string | null;
}

export interface ListProblem {
  readonly line: number;
  readonly column: number;
  readonly message: string;
}

export interface ReadList {
  readonly candidates: readonly ListedCandidate[];
  readonly problems: readonly ListProblem[];
}

interface Row {
  readonly line: number;
  readonly cells: readonly string[];
}

type Column = 'number' | 'name' | 'email';

const delimiters = [',', ';', '\t'] as const;
const mostCandidates = 5_000;

/** The delimiter that stands most often, outside quotes, in the first line that has text. */
function delimiterOf(text: string): string {
  const first = text.split(/\r\n|\n|\r/).find((line) => line.trim() !== '') ?? '';
  const bare = first.replace(/"(?:[^"]|"")*"/g, '');
  const counts = delimiters.map((delimiter) => ({ delimiter, count: bare.split(delimiter).length - 1 }));
  return counts.reduce((best, one) => (one.count > best.count ? one : best)).delimiter;
}

const headings: Readonly<Record<string, Column>> = {
  'candidate number': 'number',
  'candidate no': 'number',
  candidate: 'number',
  number: 'number',
  name: 'name',
  'full name': 'name',
  'candidate name': 'name',
  'e-mail': 'email',
  email: 'email',
  'e-mail address': 'email',
  'email address': 'email',
};

const columnOf = (cell: string): Column | null => headings[cell.trim().toLowerCase().replace(/[._]/g, ' ').replace(/\s+/g, ' ').trim()] ?? null;

const csvSentences: Readonly<Record<string, string>> = {
  CSV_QUOTE_NOT_CLOSED: 'A quotation mark is opened and never closed.',
  INVALID_OPENING_QUOTE: 'A quotation mark stands inside a field that does not begin with one.',
  CSV_INVALID_CLOSING_QUOTE: 'After a closing quotation mark comes something that is no delimiter.',
};

interface CsvRow {
  readonly record: string[];
  readonly info: { readonly lines: number };
}

const breaksIn = (cells: readonly string[]): number => cells.reduce((sum, cell) => sum + (cell.match(/\r\n|\n|\r/g)?.length ?? 0), 0);

function rowsOf(text: string): Row[] | ListProblem {
  try {
    // NOTE the declared type does not know that `info` wraps each record.
    const records = parse(text, {
      bom: true,
      delimiter: delimiterOf(text),
      info: true,
      relax_column_count: true,
      skip_empty_lines: true,
    }) as unknown as CsvRow[];
    return records.map(({ record, info }) => ({ line: info.lines - breaksIn(record), cells: record }));
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    const { lines, column } = error as CsvError & { lines?: number; column?: number };
    const at = typeof column === 'number' ? column + 1 : 1;
    return { line: lines ?? 1, column: at, message: csvSentences[error.code] ?? 'This is not understood as CSV.' };
  }
}

interface Columns {
  readonly at: Readonly<Partial<Record<Column, number>>>;
  readonly hasHeader: boolean;
  readonly problems: readonly ListProblem[];
}

/** A first row that names a column is a header; without one the order is number, name, e-mail. */
function columnsOf(first: Row): Columns {
  const named = first.cells.map(columnOf);
  if (named.every((column) => column === null)) return { at: { number: 0, name: 1, email: 2 }, hasHeader: false, problems: [] };
  const at: Partial<Record<Column, number>> = {};
  const problems: ListProblem[] = [];
  named.forEach((column, index) => {
    if (column === null) return;
    const known = at[column];
    if (known === undefined) at[column] = index;
    else problems.push({ line: first.line, column: index + 1, message: `Column ${known + 1} has this heading too.` });
  });
  if (at.number === undefined) problems.push({ line: first.line, column: 1, message: 'No column is headed “candidate number”.' });
  return { at, hasHeader: true, problems };
}

const cellText = (row: Row, at: number | undefined): string => (at === undefined ? '' : (row.cells[at] ?? '').normalize('NFC').trim());
const orNull = (text: string): string | null => (text === '' ? null : text);

function numberProblem(number: string): string | null {
  if (number === '') return 'The candidate number is missing.';
  if (number.length > 32) return 'A candidate number has at most 32 characters.';
  if (!/^[\p{L}\p{N}](?:[\p{L}\p{N} ._/-]*[\p{L}\p{N}])?$/u.test(number)) return `“${number}” is no candidate number: letters, digits and . _ / - only.`;
  return null;
}

/** Control characters and the replacement character of bytes that were no UTF-8. */
const unreadable = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffd]/;

function cellProblem(column: Column, text: string): string | null {
  if (unreadable.test(text)) return 'Some characters cannot be read. Save the file as UTF-8.';
  if (column === 'number') return numberProblem(text);
  if (text.length > 200) return 'At most 200 characters.';
  if (column === 'email' && text !== '' && !/^[^\s@,;]+@[^\s@,;]+\.[^\s@,;]+$/.test(text)) return `“${text}” is no e-mail address.`;
  return null;
}

/** Reads a class list in CSV: header optional, comma, semicolon or tab, every problem by line and column. */
export function readClassList(text: string): ReadList {
  const rows = rowsOf(text);
  if (!Array.isArray(rows)) return { candidates: [], problems: [rows] };
  const filled = rows.filter(({ cells }) => cells.some((cell) => cell.trim() !== ''));
  const [first] = filled;
  if (!first) return { candidates: [], problems: [{ line: 1, column: 1, message: 'No candidate stands in this text.' }] };
  const { at, hasHeader, problems: headProblems } = columnsOf(first);
  const problems: ListProblem[] = [...headProblems];
  if (at.number === undefined) return { candidates: [], problems };
  const body = hasHeader ? filled.slice(1) : filled;
  if (body.length === 0) problems.push({ line: first.line, column: 1, message: 'There is a header and no candidate under it.' });
  if (body.length > mostCandidates) problems.push({ line: body[mostCandidates]?.line ?? 1, column: 1, message: 'A class list has at most 5,000 candidates.' });
  const lineOf = new Map<string, number>();
  const candidates = body.map((row): ListedCandidate => {
    for (const column of ['number', 'name', 'email'] as const) {
      const message = at[column] === undefined ? null : cellProblem(column, cellText(row, at[column]));
      if (message) problems.push({ line: row.line, column: (at[column] ?? 0) + 1, message });
    }
    const extra = hasHeader ? -1 : row.cells.findIndex((cell, index) => index > 2 && cell.trim() !== '');
    if (extra >= 0) problems.push({ line: row.line, column: extra + 1, message: 'Without a header there are three columns: candidate number, name, e-mail.' });
    const number = cellText(row, at.number);
    const twin = lineOf.get(number.toUpperCase());
    if (twin !== undefined) problems.push({ line: row.line, column: (at.number ?? 0) + 1, message: `${number} stands on line ${twin} too.` });
    else if (number !== '') lineOf.set(number.toUpperCase(), row.line);
    return { line: row.line, number, name: orNull(cellText(row, at.name)), email: orNull(cellText(row, at.email)) };
  });
  return { candidates, problems };
}
