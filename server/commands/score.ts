import { readFileSync } from 'node:fs';
import { text } from 'node:stream/consumers';
import { csvText } from '../../shared/marking/csv-cell';
import { readRows } from './key-rows';
import { schemesOf, scoreRows } from './score-rows';

/** For checking from outside: a paper file as argument, `candidate,item,text` (optional `method`: ids of method marks struck, with semicolons) as CSV on standard input, marks as CSV on standard output. */
const [path] = process.argv.slice(2);
if (path === undefined) {
  console.error('Name the paper: npm run --silent score -- PAPER.json < answers.csv');
  process.exit(2);
}
try {
  const schemes = schemesOf(readFileSync(path, 'utf8'));
  const columns = ['candidate', 'item', 'text', 'parsed', 'mark', 'max', 'rule', 'slips', 'error'];
  const rows = scoreRows(schemes, readRows(await text(process.stdin)));
  process.stdout.write(csvText([columns, ...rows.map((row) => columns.map((column) => row[column] ?? ''))]));
} catch (error) {
  console.error(error instanceof Error ? error.message : String(error));
  process.exit(1);
}
