import { v7 as uuidv7 } from 'uuid';
import type { Database } from '../../db/client';
import { findVerdict, insertVerdict } from '../../db/queries/settling';
import { contextKey } from '../../shared/marking/context';
import type { Given, MarkingContext, Verdict } from '../../shared/marking/scheme';
import { markAnswer } from '../../shared/marking/verdict';
import type { SchemeInForce } from './paper-plan';

export { schemeInForce, type SchemeInForce } from './paper-plan';

/** What a verdict rests on. */
export interface VerdictInput {
  readonly canonical: string;
  readonly given: Given;
  readonly context: MarkingContext;
}

export interface StoredVerdict extends Verdict {
  readonly id: string;
}

/** The stored verdict on one distinct reading in one context; made on first sight. Equal readings share it, so they have equal marks. */
export function verdictFor(db: Database, scheme: SchemeInForce, { canonical, given, context }: VerdictInput): StoredVerdict {
  const key = contextKey(context);
  const stored = findVerdict(db, scheme.hash, canonical, key);
  if (stored) return stored;
  const fresh = markAnswer(scheme.body, given, context);
  const id = uuidv7();
  insertVerdict(db, { id, itemScheme: scheme.hash, canonical, context: key, grains: fresh.grains, rule: fresh.rule, numbers: { ...fresh.numbers } });
  return { id, ...fresh };
}

/** Whether the scheme itself says what a code is worth. */
export const decidesCode = (scheme: SchemeInForce, given: Given): boolean => markAnswer(scheme.body, given, {}).grains !== null;
