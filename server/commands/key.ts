import { text } from 'node:stream/consumers';
import { csvText } from '../../shared/marking/csv-cell';
import { keyRow, readRows, slipRows, type Row } from './key-rows';

/** For checking from outside: CSV with what is asked on standard input, CSV with the keys, or with --slips the slips, on standard output. */
const withSlips = process.argv.includes('--slips');
const rows = readRows(await text(process.stdin));
const answered: Row[] = withSlips ? rows.flatMap(slipRows) : rows.map(keyRow);
const columns = withSlips
  ? ['symbol', 'charge', 'electron', 'slip', 'wrong_value', 'silent', ...(answered.some(({ error }) => error) ? ['error'] : [])]
  : ['symbol', 'charge', 'electron', 'quantity', 'convention', ...(rows.some((row) => row.radius_pm !== undefined) ? ['radius_pm'] : []), 'sigma', 'value', 'derivation', 'error'];
process.stdout.write(csvText([columns, ...answered.map((row) => columns.map((column) => row[column] ?? ''))]));
