import { parseCode, type CheckOf, type CodeIdentity, type PageIdentity } from '../../../shared/sheets/identity';
import type { FoundCode } from './codes';

/** A code whose digits passed their check, with its place on the page. */
export interface PlacedCode {
  readonly place: number;
  readonly code: FoundCode;
}

export type Identified =
  | { readonly ok: true; readonly identity: PageIdentity; readonly codes: readonly PlacedCode[] }
  | { readonly ok: false; readonly reason: 'no-code' | 'other-codes' | 'other-format' | 'wrong-check' }
  /** More than one sheet in the picture, the same one twice included. */
  | { readonly ok: false; readonly reason: 'several-sheets'; readonly identities: readonly PageIdentity[] };

const pageOf = ({ sitting, script, page, layout }: CodeIdentity): PageIdentity => ({ sitting, script, page, layout });
const nameOf = ({ sitting, script, page, layout }: PageIdentity): string => [sitting, script, page, layout].join('/');

/**
 * What page the codes of a picture say it is. Their check has to hold, they have to agree, and each place may be there once;
 * codes with a wrong check do not count while those that pass are more. What passes has still to be known where it is filed.
 */
export function identify(codes: readonly FoundCode[], checkOf: CheckOf): Identified {
  if (codes.length === 0) return { ok: false, reason: 'no-code' };
  const parsed = codes.map((code) => ({ code, read: parseCode(code.text, checkOf) }));
  const claims = parsed.flatMap(({ code, read }) => (read.ok ? [{ code, claim: read.identity }] : []));
  const reasons = parsed.flatMap(({ read }) => (read.ok ? [] : [read.reason]));
  const wrong = reasons.filter((reason) => reason === 'wrong-check').length;
  if (wrong > 0 && wrong >= claims.length) return { ok: false, reason: 'wrong-check' };
  const [first] = claims;
  if (!first) return { ok: false, reason: reasons.includes('other-format') ? 'other-format' : 'other-codes' };
  const pages = new Map(claims.map(({ claim }) => [nameOf(claim), pageOf(claim)]));
  const places = new Set(claims.map(({ claim }) => claim.place));
  if (pages.size > 1 || places.size < claims.length) return { ok: false, reason: 'several-sheets', identities: [...pages.values()] };
  return { ok: true, identity: pageOf(first.claim), codes: claims.map(({ code, claim }) => ({ place: claim.place, code })) };
}
