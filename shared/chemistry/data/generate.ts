import { readFileSync, writeFileSync } from 'node:fs';

/** Writes the tables beside it from the published figures in the .csv files: npx tsx shared/chemistry/data/generate.ts */

type Row = Readonly<Record<string, string>>;

/** The source table has the American spelling of these two; IUPAC's recommendation is the other. */
const iupacSpelling: Readonly<Record<string, string>> = { Aluminum: 'Aluminium', Cesium: 'Caesium' };

const folder = new URL('.', import.meta.url);

function rowsOf(file: string): readonly Row[] {
  const [head = '', ...lines] = readFileSync(new URL(file, folder), 'utf8').trim().split(/\r?\n/);
  const names = head.split(',');
  return lines.map((line) => {
    const cells = line.split(',');
    if (cells.length !== names.length) throw new Error(`${file}: ${line} has ${cells.length} cells.`);
    return Object.fromEntries(names.map((name, index) => [name, cells[index] ?? '']));
  });
}

const cell = (row: Row, name: string): string => {
  const value = row[name];
  if (value === undefined) throw new Error(`No column ${name}.`);
  return value;
};

const quoted = (text: string): string => `'${text}'`;
const orNull = (text: string): string => (text === '' ? 'null' : text);

function write(file: string, lines: readonly string[]): void {
  writeFileSync(new URL(file, folder), `${lines.join('\n')}\n`);
}

function elementLine(row: Row): string {
  const name = cell(row, 'name');
  const fields = [
    `number: ${cell(row, 'atomic_number')}`,
    `symbol: ${quoted(cell(row, 'symbol'))}`,
    `name: ${quoted(iupacSpelling[name] ?? name)}`,
    `period: ${cell(row, 'period')}`,
    `group: ${orNull(cell(row, 'group'))}`,
    `block: ${quoted(cell(row, 'block'))}`,
    `configuration: ${quoted(cell(row, 'ground_configuration'))}`,
    `atomicMass: ${quoted(cell(row, 'relative_atomic_mass'))}`,
    `covalentRadiusPm: ${orNull(cell(row, 'covalent_radius_pm'))}`,
  ];
  return `  { ${fields.join(', ')} },`;
}

/** One line for each atomic number, its rows put together in the order of the source. */
function byNumber(rows: readonly Row[], entry: (row: Row, index: number) => string, [open, close]: readonly [string, string]): readonly string[] {
  const entries = new Map<string, string[]>();
  for (const row of rows) {
    const number = cell(row, 'atomic_number');
    const found = entries.get(number) ?? [];
    entries.set(number, [...found, entry(row, found.length)]);
  }
  return [...entries].map(([number, found]) => `  ${number}: ${open}${found.join(', ')}${close},`);
}

function energyEntry(row: Row, index: number): string {
  if (cell(row, 'ion_charge') !== String(index)) throw new Error('The ion charges of an element have a gap.');
  return `[${quoted(cell(row, 'ionization_energy_eV'))}, ${quoted(cell(row, 'uncertainty_eV'))}]`;
}

write('elements.ts', [
  '// Written by generate.ts from elements.csv.',
  '// Names: IUPAC. Configurations: ground levels of the NIST Atomic Spectra Database, in order of n, then l (104 to 118: predicted).',
  '// Relative atomic masses: standard atomic weights, IUPAC (mass number of a long-lived isotope where there is none).',
  '// Covalent radii: Cordero et al., Dalton Trans. 2832 (2008), doi 10.1039/b801115j, in pm.',
  '',
  'export interface ElementRow {',
  '  readonly number: number;',
  '  readonly symbol: string;',
  '  readonly name: string;',
  '  readonly period: number;',
  '  /** 1 to 18; null in the f block. */',
  '  readonly group: number | null;',
  "  readonly block: 's' | 'p' | 'd' | 'f';",
  '  readonly configuration: string;',
  '  readonly atomicMass: string;',
  '  readonly covalentRadiusPm: number | null;',
  '}',
  '',
  'export const elementRows: readonly ElementRow[] = [',
  ...rowsOf('elements.csv').map(elementLine),
  '];',
]);

write('screening-constants.ts', [
  '// Written by generate.ts from screening-constants.csv.',
  '// Z = 1 to 36: E. Clementi and D. L. Raimondi, J. Chem. Phys. 38, 2686 (1963), doi 10.1063/1.1733573.',
  '// Z = 37 to 86: E. Clementi, D. L. Raimondi and W. P. Reinhardt, J. Chem. Phys. 47, 1300 (1967), doi 10.1063/1.1712084.',
  '// sigma = Z - n x zeta from optimised single-zeta exponents. Nb, Mo, Ru, Rh, Pd, Ag: exponents of the ground configuration;',
  '// La, Pr, Nd, Pm: the dominant one of the two 4f exponents. As redistributed by the MIT-licensed mendeleev package (L. Mentel).',
  '',
  '/** Screening constants by atomic number and subshell. */',
  'export const screeningConstants: Readonly<Record<number, Readonly<Record<string, string>>>> = {',
  ...byNumber(
    rowsOf('screening-constants.csv'),
    (row) => `'${cell(row, 'n')}${cell(row, 'subshell')}': ${quoted(cell(row, 'screening_constant'))}`,
    ['{ ', ' }'],
  ),
  '};',
]);

write('ionisation-energies.ts', [
  '// Written by generate.ts from ionisation-energies.csv.',
  '// NIST Atomic Spectra Database, as redistributed by the MIT-licensed mendeleev package (L. Mentel).',
  '',
  '/** [energy, uncertainty] in eV by atomic number, then by the charge of the species that is ionised: 0, 1, 2 and on. */',
  'export const ionisationEnergiesEv: Readonly<Record<number, readonly (readonly [string, string])[]>> = {',
  ...byNumber(rowsOf('ionisation-energies.csv'), energyEntry, ['[', ']']),
  '};',
]);
