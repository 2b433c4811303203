import { createHash } from 'node:crypto';
import type { Database } from '../../db/client';
import { insertItemScheme } from '../../db/queries/papers';
import type { ItemScheme } from '../../shared/marking/scheme';

/** JSON with sorted keys: the same content is the same text. */
export function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  if (typeof value !== 'object' || value === null) return JSON.stringify(value) ?? 'null';
  const entries = Object.entries(value).filter(([, part]) => part !== undefined);
  entries.sort(([one], [other]) => (one < other ? -1 : one > other ? 1 : 0));
  return `{${entries.map(([name, part]) => `${JSON.stringify(name)}:${canonicalJson(part)}`).join(',')}}`;
}

export const schemeHash = (scheme: ItemScheme): string => createHash('sha256').update(canonicalJson(scheme)).digest('hex');

/** Keeps a scheme under the hash of its content; one that is known already stays the same row. */
export function storeScheme(db: Database, scheme: ItemScheme): string {
  const hash = schemeHash(scheme);
  insertItemScheme(db, hash, scheme);
  return hash;
}
