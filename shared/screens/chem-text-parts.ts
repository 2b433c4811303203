export type ChemPart =
  | { readonly kind: 'plain'; readonly text: string }
  | { readonly kind: 'zeff' }
  | { readonly kind: 'symbol'; readonly text: string }
  | { readonly kind: 'raised'; readonly text: string };

const plainOf: Readonly<Record<string, string>> = {
  '⁰': '0', '¹': '1', '²': '2', '³': '3', '⁴': '4', '⁵': '5', '⁶': '6', '⁷': '7', '⁸': '8', '⁹': '9', '⁺': '+', '⁻': '−',
};

const pattern = /Z_eff|σ|[⁰¹²³⁴-⁹⁺⁻]+|\b[1-7][spdf]\b/gu;

/** The same text in letters that every face has, for places that set plain text only: "Mg²⁺ 2p" is "Mg2+ 2p". */
export const plainChem = (text: string): string => [...text].map((letter) => plainOf[letter] ?? letter).join('').replace('Z_eff', 'Zeff');

/** Plain text cut where our type sets it otherwise: "Z_eff of Fe²⁺ 3d" has a symbol, a raised charge and an orbital letter. */
export function chemParts(text: string): ChemPart[] {
  const parts: ChemPart[] = [];
  let from = 0;
  const plain = (until: number) => {
    if (until > from) parts.push({ kind: 'plain', text: text.slice(from, until) });
  };
  for (const match of text.matchAll(pattern)) {
    plain(match.index);
    const [found] = match;
    if (found === 'Z_eff') parts.push({ kind: 'zeff' });
    else if (found === 'σ') parts.push({ kind: 'symbol', text: found });
    else if (/^[1-7]/.test(found)) parts.push({ kind: 'plain', text: found.charAt(0) }, { kind: 'symbol', text: found.charAt(1) });
    else parts.push({ kind: 'raised', text: [...found].map((letter) => plainOf[letter] ?? letter).join('') });
    from = match.index + found.length;
  }
  plain(text.length);
  return parts;
}
