import { elementBySymbol } from './elements';
import { found, refused } from './result';
import type { Result } from './result';
import { byShellThenLetter, capacity, isSameSubshell, parseSubshell, subshellLabel } from './subshells';
import type { Configuration, Occupation } from './subshells';

const raisedDigits = '⁰¹²³⁴⁵⁶⁷⁸⁹';
const lowered = (digits: string): number => Number([...digits].map((digit) => (raisedDigits.includes(digit) ? raisedDigits.indexOf(digit) : digit)).join(''));

const nobleGases = ['He', 'Ne', 'Ar', 'Kr', 'Xe', 'Rn', 'Og'];

/** A subshell with its count; plain counts end at a space, raised ones end by themselves. */
const term = /([1-9][a-z])(?:(\d{1,2})(?=\s|$)|([⁰¹²³⁴⁵⁶⁷⁸⁹]{1,2}))/y;

/**
 * Reads a typed configuration, full or behind a noble gas in brackets. Grammar: our own, from common practice.
 * parseConfiguration('[Ne] 3s2 3p5') is 1s2 2s2 2p6 3s2 3p5; a refusal says where.
 */
export function parseConfiguration(text: string): Result<Configuration> {
  const opening = coreOf(text);
  if (!opening.ok) return opening;
  const occupations: Occupation[] = [...opening.value.core];
  let at = opening.value.end;
  for (;;) {
    while (/\s/.test(text.charAt(at))) at += 1;
    if (at >= text.length) break;
    const next = occupationAt(text, at);
    if (!next.ok) return next;
    const { occupation, end } = next.value;
    if (occupations.some((other) => isSameSubshell(other, occupation))) {
      return refused('configuration-not-understood', `${subshellLabel(occupation)} stands twice in this configuration.`, at);
    }
    occupations.push(occupation);
    at = end;
  }
  if (occupations.length === 0) return refused('configuration-not-understood', 'A configuration is needed, such as 1s2 2s2 2p5.', 0);
  return found(occupations.sort(byShellThenLetter));
}

function coreOf(text: string): Result<{ core: Configuration; end: number }> {
  const match = /^\s*\[([^\]]*)\]/.exec(text);
  if (!match) return found({ core: [], end: 0 });
  const [whole, symbol = ''] = match;
  const element = elementBySymbol(symbol.trim());
  if (!element.ok || !nobleGases.includes(element.value.symbol)) {
    return refused('configuration-not-understood', `Only a noble gas stands in brackets, and “${symbol}” is none.`, whole.indexOf('['));
  }
  const core = parseConfiguration(element.value.configuration);
  return core.ok ? found({ core: core.value, end: whole.length }) : core;
}

function occupationAt(text: string, at: number): Result<{ occupation: Occupation; end: number }> {
  term.lastIndex = at;
  const match = term.exec(text);
  const word = text.slice(at).split(/\s/)[0] ?? '';
  if (!match) {
    return refused('configuration-not-understood', `“${word}” is not understood. Write subshell and count, with a space between terms: 2s2 2p5.`, at);
  }
  const [whole, label = '', plain, raised] = match;
  const subshell = parseSubshell(label);
  if (!subshell.ok) return refused('configuration-not-understood', subshell.problem.message, at);
  const count = lowered(plain ?? raised ?? '');
  const most = capacity(subshell.value.l);
  if (count > most) return refused('configuration-not-understood', `A ${label} subshell holds ${most} electrons at most, not ${count}.`, at);
  if (count === 0) return refused('configuration-not-understood', `An empty subshell is left out: ${whole}.`, at);
  return found({ occupation: { ...subshell.value, count }, end: at + whole.length });
}

/** The plain written form: formatConfiguration of boron is "1s2 2s2 2p1". Order of n, then l, as in the NIST Atomic Spectra Database. */
export const formatConfiguration = (configuration: Configuration): string =>
  configuration.map((occupation) => `${subshellLabel(occupation)}${occupation.count}`).join(' ');
