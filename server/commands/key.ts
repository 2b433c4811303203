import { text } from 'node:stream/consumers';
import { csvCell } from '../../shared/marking/csv-cell';
import { keyRow, readRows, slipRows, type Row } from './key-rows';

const given = ['symbol', 'charge', 'electron', 'quantity', 'convention'];
const found = ['sigma', 'value', 'derivation', 'error'];
const slipColumns = ['symbol', 'charge', 'electron', 'slip', 'wrong_value', 'silent'];

/** A charge such as +2 comes back as it was written; it is no formula. */
const cell = (value: string): string => (/^[+-]?\d+$/.test(value) ? value : csvCell(value));

function refuse(sentence: string): never {
  console.error(sentence);
  process.exit(1);
}

/** The rows of the input; one that is no CSV, or has no column for the element, has no row to say so in. */
async function inputRows(): Promise<Row[]> {
  let rows: Row[] = [];
  try {
    rows = readRows(await text(process.stdin));
  } catch (error) {
    refuse(`The input cannot be read as CSV: ${error instanceof Error ? error.message : String(error)}`);
  }
  if (rows.some((row) => !Object.hasOwn(row, 'symbol'))) refuse(`The first line names the columns: ${given.join(',')}, and radius_pm and counts_itself where an electronegativity needs them.`);
  return rows;
}

/** For checking from outside: CSV with what is asked on standard input, CSV with the keys, or with --slips the slips, on standard output. */
const options = process.argv.slice(2);
const unknown = options.find((option) => option !== '--slips');
if (unknown !== undefined) refuse(`“${unknown}” is no option of this command; there is --slips.`);
const rows = await inputRows();
const answered: Row[] = options.length > 0 ? rows.flatMap(slipRows) : rows.map(keyRow);
const own = [...new Set([...given, ...Object.keys(rows[0] ?? {})])].filter((column) => !found.includes(column));
const columns = options.length > 0 ? [...slipColumns, ...(answered.some(({ error }) => error) ? ['error'] : [])] : [...own, ...found];
const lines = [columns, ...answered.map((row) => columns.map((column) => row[column] ?? ''))];
process.stdout.write(lines.map((line) => `${line.map(cell).join(',')}\r\n`).join(''));
