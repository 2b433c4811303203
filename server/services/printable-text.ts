/** Signs the shipped text fonts lack, as a printer without them writes them. */
const replacements: readonly (readonly [RegExp, string])[] = [
  [/σ/g, 'sigma'],
  [/√/g, 'sqrt '],
  [/→/g, 'to'],
];

const raised: Readonly<Record<string, string>> = { '⁰': '0', '¹': '1', '²': '2', '³': '3', '⁴': '4', '⁵': '5', '⁶': '6', '⁷': '7', '⁸': '8', '⁹': '9', '⁺': '+', '⁻': '-' };

/** Plain text that the shipped fonts can set: raised figures go in brackets, Mg²⁺ is Mg(2+); sigma is spelled. */
export function printableText(text: string): string {
  const flat = text.replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻]+/g, (signs) => {
    const plain = [...signs].map((sign) => raised[sign] ?? '').join('');
    return /[+-]/.test(plain) ? `(${plain})` : `^${plain}`;
  });
  return replacements.reduce((done, [pattern, by]) => done.replace(pattern, by), flat);
}
