import { v7 as uuidv7 } from 'uuid';
import type { Database } from '../../db/client';
import { findVerdict, insertVerdict, schemeOfItem } from '../../db/queries/settling';
import { emptyContext, type Given, type ItemScheme } from '../../shared/marking/scheme';
import { contextKey, markAnswer } from '../../shared/marking/verdict';

export interface SchemeInForce {
  readonly hash: string;
  readonly body: ItemScheme;
}

/** Scheme versions never change, so what was read once stays true. */
const known = new WeakMap<Database, Map<string, SchemeInForce>>();

/** The scheme of an item in a version. */
export function schemeInForce(db: Database, version: string, itemId: string): SchemeInForce {
  const schemes = known.get(db) ?? new Map<string, SchemeInForce>();
  known.set(db, schemes);
  const key = `${version} ${itemId}`;
  const remembered = schemes.get(key);
  if (remembered) return remembered;
  const scheme = schemeOfItem(db, version, itemId);
  if (!scheme) throw new Error(`Item ${itemId} has no scheme in version ${version}.`);
  schemes.set(key, scheme);
  return scheme;
}

/** The stored verdict on one distinct reading; made on first sight. Equal readings share it, so they have equal marks. */
export function verdictFor(db: Database, scheme: SchemeInForce, canonical: string, given: Given): { id: string; grains: number | null } {
  const context = contextKey(emptyContext);
  const stored = findVerdict(db, scheme.hash, canonical, context);
  if (stored) return stored;
  const fresh = markAnswer(scheme.body, given, emptyContext);
  const id = uuidv7();
  insertVerdict(db, { id, itemScheme: scheme.hash, canonical, context, grains: fresh.grains, rule: fresh.rule, numbers: { ...fresh.numbers } });
  return { id, grains: fresh.grains };
}
