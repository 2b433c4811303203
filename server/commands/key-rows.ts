import { parse } from 'csv-parse/sync';
import { outermost, speciesOf } from '../../shared/chemistry/configurations';
import { computedConventions } from '../../shared/chemistry/conventions';
import { compare, decimal, divide, exactDecimals, toDecimals, toFigures, whole, zero, type Exact } from '../../shared/chemistry/exact';
import { slipsOf } from '../../shared/chemistry/slips/slips-of';
import { subshellLabel } from '../../shared/chemistry/subshells';
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

const isWholeNumber = (text: string): boolean => /^[+-]?\d{1,3}$/.test(text.replace('−', '-'));

/** The radius of an electronegativity in ångström, as its question would print it; a sentence where it cannot be. */
function angstromOf(radius: string): { readonly text: string } | string {
  if (radius === '') return 'radius_pm: an electronegativity needs the radius in pm, such as 99.';
  if (!/^\d+(\.\d+)?$/.test(radius) || compare(decimal(radius), zero) <= 0) return `radius_pm: “${radius}” is no length in pm.`;
  const angstrom = divide(decimal(radius), whole(100));
  const places = exactDecimals(angstrom) ?? 0;
  if (places > 4 || compare(angstrom, whole(100)) >= 0) return `radius_pm: “${radius}” is out of range; write less than 10000 pm with at most two decimals.`;
  return { text: toDecimals(angstrom, places) };
}

const countsItselfTexts: Readonly<Record<string, boolean>> = { '': false, no: false, yes: true };

/** What a row asks for, or the sentence that says why it cannot be read. An electron that is not named is the outermost one. */
function askedBy(row: Row): AskedInput | string {
  const { symbol = '', charge: chargeText = '', electron = '', quantity: asked = '', convention = '', radius_pm: radius = '', counts_itself: itself = '' } = row;
  if (symbol === '') return 'symbol: name an element.';
  if (chargeText !== '' && !isWholeNumber(chargeText)) return `charge: “${chargeText}” is no whole number of up to three digits.`;
  const charge = chargeText === '' ? 0 : Number(chargeText.replace('−', '-'));
  const quantity = asked === '' ? 'zeff' : asked;
  if (!quantities.includes(quantity)) return `quantity: “${quantity}” is none of ${quantities.join(', ')}.`;
  if (convention !== '' && !Object.hasOwn(computedConventions, convention)) return `convention: “${convention}” is none of ${Object.keys(computedConventions).join(', ')}.`;
  const named = electron === '' ? outermostOf(symbol, charge) : { electron };
  if (typeof named === 'string') return named;
  const plain = { symbol, charge, ...named, quantity, convention: convention === '' ? 'slater' : convention };
  if (quantity !== 'electronegativity') return plain;
  const angstrom = angstromOf(radius);
  if (typeof angstrom === 'string') return angstrom;
  const countsItself = Object.hasOwn(countsItselfTexts, itself) ? countsItselfTexts[itself] : undefined;
  return countsItself === undefined ? `counts_itself: “${itself}” is neither yes nor no.` : { ...plain, radiusAngstrom: angstrom.text, countsItself };
}

function outermostOf(symbol: string, charge: number): { readonly electron: string } | string {
  const species = speciesOf({ symbol, charge });
  if (!species.ok) return species.problem.message;
  const electron = outermost(species.value.configuration);
  return electron ? { electron: subshellLabel(electron) } : 'electron: name one, such as 3p.';
}

/** The working in one line, the electron's own group first; where no electrons are counted, the steps alone. */
function lineOf({ derivation }: Worked, quantity: string): string {
  const { groups, nuclearCharge, zeff, sigma, steps } = derivation;
  if (groups.length === 0) return steps.join('; ');
  const counted = [...groups]
    .reverse()
    .filter(({ counted: count, coefficient }) => count > 0 && coefficient.fraction !== '0')
    .map(({ counted: count, coefficient }) => `${count} x ${coefficient.text}`);
  if (quantity === 'sigma') return `${counted.join(' + ') || '0'} = ${sigma.text}`;
  return [`${nuclearCharge} - ${counted.length === 0 ? '0' : `(${counted.join(' + ')})`} = ${zeff.text}`, ...steps].join('; ');
}

/** One row answered: its own columns, the electron named, then sigma, value, derivation, error; an error leaves the others empty. */
export function keyRow(row: Row): Row {
  const asked = askedBy(row);
  const refused = (error: string): Row => ({ ...row, sigma: '', value: '', derivation: '', error });
  if (typeof asked === 'string') return refused(asked);
  const worked = work(asked);
  if (!worked.ok) return refused(worked.problem.message);
  const { value, sigma } = worked.value;
  return {
    ...row,
    electron: asked.electron,
    sigma: sigma === null ? '' : valueText(sigma, { decimals: 2, figures: null }),
    value: valueText(value, worked.value),
    derivation: lineOf(worked.value, asked.quantity),
    error: '',
  };
}

/** The slips of one row, one row each; a row that cannot be read, or on which no slip is worked, gives one row that says so. */
export function slipRows(row: Row): Row[] {
  const asked = askedBy(row);
  const own = { symbol: row.symbol ?? '', charge: row.charge ?? '' };
  const refused = (error: string): Row[] => [{ ...own, electron: row.electron ?? '', slip: '', wrong_value: '', silent: '', error }];
  if (typeof asked === 'string') return refused(asked);
  const worked = work(asked);
  if (!worked.ok) return refused(worked.problem.message);
  const slips = slipsOf(asked);
  if (slips.length === 0) return refused('Slips are worked under slater only, and not where the electron counts itself.');
  return slips.map(({ id, text, isSilent }) => ({ ...own, electron: asked.electron, slip: id, wrong_value: text, silent: isSilent ? 'yes' : 'no', error: '' }));
}
