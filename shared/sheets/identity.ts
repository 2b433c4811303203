/** What the codes of one printed page say; `place` is where on the page the code stands (see geometry). */
export interface PageIdentity {
  /** The print number of the sitting. */
  readonly sitting: number;
  /** The number of the script within its sitting. */
  readonly script: number;
  readonly page: number;
  /** The ordinal of the layout the page was printed from. */
  readonly layout: number;
}

export interface CodeIdentity extends PageIdentity {
  readonly place: number;
}

/** Works out the six check digits of the eighteen before them; keyed, so it lives where the secret is. */
export type CheckOf = (digits: string) => string;

export type ParsedCode =
  | { readonly ok: true; readonly identity: CodeIdentity }
  | { readonly ok: false; readonly reason: 'not-ours' | 'other-format' | 'wrong-check' };

export const codeFormat = 1;
export const digitsOfCode = 24;
export const digitsUnderCheck = 18;

/** In the order they stand after the format digit. */
const fields = [
  ['sitting', 6],
  ['script', 5],
  ['page', 2],
  ['place', 1],
  ['layout', 3],
] as const;

/** The largest number that has room in the code. */
export const largest = { sitting: 999_999, script: 99_999, page: 99, place: 9, layout: 999 } as const;

/** The 24 digits of one code: format 1, sitting 6, script 5, page 2, place 1, layout 3, check 6. */
export function composeCode(identity: CodeIdentity, checkOf: CheckOf): string {
  const digits = fields.map(([name, width]) => {
    const value = identity[name];
    if (!Number.isInteger(value) || value < 1 || value > largest[name]) throw new RangeError(`No room in the code for ${name} ${value}.`);
    return String(value).padStart(width, '0');
  });
  const first = `${codeFormat}${digits.join('')}`;
  return `${first}${checkOf(first)}`;
}

/** Reads the text of a code back. What passes is still only a claim: the page has to exist in the sitting that is being filed. */
export function parseCode(text: string, checkOf: CheckOf): ParsedCode {
  if (!/^[0-9]{24}$/.test(text)) return { ok: false, reason: 'not-ours' };
  if (text[0] !== String(codeFormat)) return { ok: false, reason: 'other-format' };
  const first = text.slice(0, digitsUnderCheck);
  if (checkOf(first) !== text.slice(digitsUnderCheck)) return { ok: false, reason: 'wrong-check' };
  let at = 1;
  const values = fields.map(([name, width]) => {
    at += width;
    return [name, Number.parseInt(first.slice(at - width, at), 10)] as const;
  });
  const identity = Object.fromEntries(values) as Record<(typeof fields)[number][0], number>;
  return Object.values(identity).every((value) => value > 0) ? { ok: true, identity } : { ok: false, reason: 'not-ours' };
}
