import { parse } from 'csv-parse/sync';
import { computedConventions } from '../../shared/chemistry/conventions';
import { decimal, divide, exactDecimals, toDecimals, toFigures, whole, type Exact } from '../../shared/chemistry/exact';
import { slipsOf } from '../../shared/chemistry/slips/slips-of';
import { work, type AskedInput, type Worked } from '../../shared/chemistry/work';

export type Row = Readonly<Record<string, string>>;

const quantities = ['zeff', 'sigma', 'energy-ev', 'energy-kj-mol', 'radius-pm', 'electronegativity'];

/** Rows of a CSV text by the names of its first line; cells are trimmed, nothing else is changed. */
export const readRows = (text: string): Row[] => parse(text, { columns: true, trim: true, skip_empty_lines: true, bom: true, relax_column_count: true }) as Row[];

/** A value as text: whole where it is a short decimal, else to its figures. */
function valueText(value: Exact, { decimals, figures }: Pick<Worked, 'decimals' | 'figures'>): string {
  const exact = exactDecimals(value);
  if (exact !== null && exact <= 6) return toDecimals(value, Math.max(exact, figures === null ? decimals : 0));
  return toFigures(value, figures ?? 4);
}

const isWholeNumber = (text: string): boolean => /^[+-]?\d+$/.test(text.replace('−', '-'));

/** What a row asks for, or the sentence that says why it cannot be read. */
function askedBy(row: Row): AskedInput | string {
  const { symbol = '', charge = '', electron = '', quantity = '', convention = '', radius_pm: radius = '' } = row;
  if (symbol === '') return 'symbol: name an element.';
  if (charge !== '' && !isWholeNumber(charge)) return `charge: “${charge}” is no whole number.`;
  if (electron === '') return 'electron: name one, such as 3p.';
  if (quantity !== '' && !quantities.includes(quantity)) return `quantity: “${quantity}” is none of ${quantities.join(', ')}.`;
  if (convention !== '' && !Object.hasOwn(computedConventions, convention)) return `convention: “${convention}” is none of ${Object.keys(computedConventions).join(', ')}.`;
  if (radius !== '' && !/^\d+(\.\d+)?$/.test(radius)) return `radius_pm: “${radius}” is no length in pm.`;
  const angstrom = radius === '' ? undefined : divide(decimal(radius), whole(100));
  return {
    symbol,
    charge: charge === '' ? 0 : Number(charge.replace('−', '-')),
    electron,
    quantity: quantity === '' ? 'zeff' : quantity,
    convention: convention === '' ? 'slater' : convention,
    ...(angstrom === undefined ? {} : { radiusAngstrom: toDecimals(angstrom, exactDecimals(angstrom) ?? 6), countsItself: false }),
  };
}

/** The working in one line; where no electrons are counted, the steps alone. */
const terms = ({ derivation }: Worked): string => {
  if (derivation.groups.length === 0) return derivation.steps.join('; ');
  const counted = derivation.groups.filter(({ counted: count, coefficient }) => count > 0 && coefficient.fraction !== '0').map(({ counted: count, coefficient }) => `${count} x ${coefficient.text}`);
  const sum = counted.length === 0 ? '0' : `(${counted.join(' + ')})`;
  return [`${derivation.nuclearCharge} - ${sum} = ${derivation.zeff.text}`, ...derivation.steps].join('; ');
};

/** One row answered: its own columns, then sigma, value, derivation, error; an error leaves the others empty. */
export function keyRow(row: Row): Row {
  const asked = askedBy(row);
  const own = { symbol: row.symbol ?? '', charge: row.charge ?? '', electron: row.electron ?? '', quantity: row.quantity ?? '', convention: row.convention ?? '', ...(row.radius_pm === undefined ? {} : { radius_pm: row.radius_pm }) };
  const refused = (error: string): Row => ({ ...own, sigma: '', value: '', derivation: '', error });
  if (typeof asked === 'string') return refused(asked);
  const worked = work(asked);
  if (!worked.ok) return refused(worked.problem.message);
  const { value, sigma } = worked.value;
  return { ...own, sigma: sigma === null ? '' : valueText(sigma, { decimals: 2, figures: null }), value: valueText(value, worked.value), derivation: terms(worked.value), error: '' };
}

/** The slips of one row, one row each; a row that cannot be read gives one row with its error. */
export function slipRows(row: Row): Row[] {
  const asked = askedBy(row);
  const own = { symbol: row.symbol ?? '', charge: row.charge ?? '', electron: row.electron ?? '' };
  const refused = (error: string): Row[] => [{ ...own, slip: '', wrong_value: '', silent: '', error }];
  if (typeof asked === 'string') return refused(asked);
  const worked = work(asked);
  if (!worked.ok) return refused(worked.problem.message);
  return slipsOf(asked).map(({ id, text, isSilent }) => ({ ...own, slip: id, wrong_value: text, silent: isSilent ? 'yes' : 'no', error: '' }));
}
