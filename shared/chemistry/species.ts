const raised = ['⁰', '¹', '²', '³', '⁴', '⁵', '⁶', '⁷', '⁸', '⁹'];

/** A charge as it is raised behind a symbol: chargeText(2) is "²⁺", chargeText(-1) is "⁻", chargeText(0) is "". Common practice, no source. */
export function chargeText(charge: number): string {
  if (charge === 0) return '';
  const size = Math.abs(charge);
  const digits = size === 1 ? '' : [...String(size)].map((digit) => raised[Number(digit)]).join('');
  return `${digits}${charge > 0 ? '⁺' : '⁻'}`;
}

/** Symbol and charge: speciesText('Fe', 2) is "Fe²⁺". Common practice, no source. */
export const speciesText = (symbol: string, charge: number): string => `${symbol}${chargeText(charge)}`;

/** Letters whose name begins with a vowel sound, for symbols are read out by their letters: "an F atom", "a U atom". */
const vowelSounds = 'AEFHILMNORSX';

/** A species with its article: withArticle('Cl', 0) is "a Cl atom", withArticle('Fe', 2) is "an Fe²⁺ ion". English usage, no source. */
export function withArticle(symbol: string, charge: number): string {
  const article = vowelSounds.includes(symbol.charAt(0)) ? 'an' : 'a';
  return `${article} ${speciesText(symbol, charge)} ${charge === 0 ? 'atom' : 'ion'}`;
}
