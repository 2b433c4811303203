import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { csvCell, csvText } from './csv-cell';

/** One record read back by RFC 4180 (2005), section 2, rules 5 to 7: our own reader, apart from the code. */
function readBack(line: string): string[] {
  const cells: string[] = [];
  let rest = line;
  for (;;) {
    const cell = /^"((?:[^"]|"")*)"|^[^,"\r\n]*/.exec(rest) ?? [''];
    cells.push(cell[1]?.replaceAll('""', '"') ?? cell[0]);
    rest = rest.slice(cell[0].length);
    if (!rest.startsWith(',')) return rest === '\r\n' ? cells : [];
    rest = rest.slice(1);
  }
}

describe('a table as a CSV text', () => {
  it('quotes what RFC 4180 has quoted, and nothing else', () => {
    expect(csvText([['a', 'b c'], ['d,e', 'say "f"'], ['g\nh', 'i\rj']])).toBe('a,b c\r\n"d,e","say ""f"""\r\n"g\nh","i\rj"\r\n');
    expect(csvText([])).toBe('');
  });

  it('reads back as it was, but for the mark before a formula', () => {
    const harmless = fc.string({ unit: fc.constantFrom(...'ab1.,"\n\r ='), maxLength: 8 }).filter((text) => !/^[=+\-@\t\r]/.test(text));
    fc.assert(fc.property(fc.array(harmless, { minLength: 1, maxLength: 4 }), (row) => { expect(readBack(csvText([row]))).toEqual(row); }));
  });

  // OWASP, "CSV Injection": what begins with = + - @, a tab or a carriage return may be taken for a formula (from memory).
  it.each(['=6.10', '+6.10', '-', '-6.10-1', '@SUM(A1)', '\t=1', '-1.', '-.5', '-1 2', '=1e3'])('puts an apostrophe before %j', (text) => expect(csvCell(text)).toBe(`'${text}`));

  it('does so inside the quotes', () => expect(csvCell('=A1,"x"')).toBe('"\'=A1,""x"""'));

  it.each(['-0.35', '-12', '6.10', '10', 'a=b', '', '1-2', 'x@y'])('leaves %j alone', (text) => expect(csvCell(text)).toBe(text));
});
