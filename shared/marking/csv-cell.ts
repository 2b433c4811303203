const strictNumber = /^-?\d+(?:\.\d+)?$/;
const startsFormula = /^[=+\-@\t\r]/;

/**
 * One cell of a CSV file (RFC 4180 quoting). A strict number stays as it is; any other text that a spreadsheet could take
 * for a formula gets a leading apostrophe: `=6.10` becomes `'=6.10`, `-0.35` stays.
 */
export function csvCell(text: string): string {
  const safe = !strictNumber.test(text) && startsFormula.test(text) ? `'${text}` : text;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/** Rows as a CSV text, lines ended by CR LF. */
export const csvText = (rows: readonly (readonly string[])[]): string => rows.map((row) => `${row.map(csvCell).join(',')}\r\n`).join('');
