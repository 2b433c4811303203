/** How a stretch of text is set: in the text's own fount, as a symbol, or as a small subscript. */
export type RunStyle = 'plain' | 'symbol' | 'subscript';

export interface Run {
  readonly style: RunStyle;
  readonly text: string;
}

/** Quantities stand in italic; the text founts lack Greek and raised figures, which the fount of symbols has. */
const special = /Z_eff|[σχζ⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻]+/g;

/** Plain text in stretches that the shipped founts can set; an arrow, which none of them has, is spelled. */
export function printRuns(text: string): Run[] {
  const spelled = text.replaceAll('→', 'to');
  const runs: Run[] = [];
  let done = 0;
  for (const found of spelled.matchAll(special)) {
    if (found.index > done) runs.push({ style: 'plain', text: spelled.slice(done, found.index) });
    if (found[0] === 'Z_eff') runs.push({ style: 'symbol', text: 'Z' }, { style: 'subscript', text: 'eff' });
    else runs.push({ style: 'symbol', text: found[0] });
    done = found.index + found[0].length;
  }
  if (done < spelled.length || runs.length === 0) runs.push({ style: 'plain', text: spelled.slice(done) });
  return runs;
}
