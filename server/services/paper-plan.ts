import type { Database } from '../../db/client';
import { answersOfScript, schemesOfVersion } from '../../db/queries/settling';
import { completeScheme } from '../../shared/marking/complete-scheme';
import { contextFor, type PaperFacts } from '../../shared/marking/context';
import type { ItemScheme, MarkingContext } from '../../shared/marking/scheme';
import { struckIds } from '../../shared/marking/struck';

export interface SchemeInForce {
  readonly hash: string;
  readonly body: ItemScheme;
}

interface PlannedItem extends SchemeInForce {
  readonly id: string;
  /** Paper order, from 0. */
  readonly at: number;
}

/** How the marks of one paper depend on each other under one version of its scheme. */
export interface PaperPlan {
  readonly items: ReadonlyMap<string, PlannedItem>;
  /** No item follows from another, and nothing is penalised once a paper: each mark rests on its own answer. */
  readonly isPlain: boolean;
}

/** Scheme versions never change, so what was read once stays true. */
const known = new WeakMap<Database, Map<string, PaperPlan>>();

export function paperPlan(db: Database, version: string): PaperPlan {
  const plans = known.get(db) ?? new Map<string, PaperPlan>();
  known.set(db, plans);
  const remembered = plans.get(version);
  if (remembered) return remembered;
  const items = new Map(schemesOfVersion(db, version).map(({ id, hash, body }, at) => [id, { id, at, hash, body }]));
  const isPlain = [...items.values()].every(({ body }) => !body.followThrough && !body.unitRule && !body.signRule);
  const plan = { items, isPlain };
  plans.set(version, plan);
  return plan;
}

/** The scheme of an item in a version. */
export function schemeInForce(db: Database, version: string, itemId: string): SchemeInForce {
  const scheme = paperPlan(db, version).items.get(itemId);
  if (!scheme) throw new Error(`Item ${itemId} has no scheme in version ${version}.`);
  return scheme;
}

const follows = ({ body }: PlannedItem, itemIds: ReadonlySet<string>): boolean => {
  const link = body.followThrough;
  return link !== null && link !== undefined && (itemIds.has(link.from) || (link.second !== undefined && itemIds.has(link.second.from)));
};

/** The items whose marks may change when the answers of some change, those included, in paper order. */
export function itemsAffected(plan: PaperPlan, itemIds: readonly string[]): string[] {
  const changed = new Set(itemIds);
  const all = [...plan.items.values()];
  const affected = all.filter((item) => changed.has(item.id) || follows(item, changed));
  const firstAt = (rule: 'unitRule' | 'signRule'): number => Math.min(...affected.filter(({ body }) => body[rule]).map(({ at }) => at), Infinity);
  const [unitFrom, signFrom] = [firstAt('unitRule'), firstAt('signRule')];
  const near = new Set(affected.map(({ id }) => id));
  return all.filter(({ id, at, body }) => near.has(id) || (body.unitRule && at > unitFrom) || (body.signRule && at > signFrom)).map(({ id }) => id);
}

type ScriptAnswer = ReturnType<typeof answersOfScript>[number];

/** A settled form; a mark that was ruled without a value says that none is carried on, and so does an item that was withdrawn unread. */
function settledOf(plan: PaperPlan, answer: ScriptAnswer | undefined): string | null {
  if (!answer) return null;
  const { withdrawn = 'none' } = plan.items.get(answer.item)?.body ?? {};
  return answer.settledCanonical ?? (answer.state === 'ruled' || withdrawn !== 'none' ? '@' : null);
}

/** What the rest of a script says to the mark of one of its answers. */
export interface AnswerContext {
  readonly facts: PaperFacts;
  readonly context: MarkingContext;
  /** The answers that it follows from and that are still held or unread. */
  readonly open: readonly string[];
}

const nothingElse = { followed: null, second: null, isUnitCharged: false, isSignCharged: false };

/** The context of one answer with the method marks struck; a plain paper is not even looked into. */
export function answerContext(db: Database, plan: PaperPlan, { script, item }: { readonly script: string; readonly item: string }, method: string): AnswerContext {
  const planned = plan.items.get(item);
  if (!planned) throw new Error(`Item ${item} is not on the paper.`);
  const struck = struckIds(method);
  if (plan.isPlain) {
    const facts = { ...nothingElse, struck };
    return { facts, context: contextFor(planned.body, facts), open: [] };
  }
  const answers = new Map(answersOfScript(db, script).map((answer) => [answer.item, answer]));
  const { followThrough } = completeScheme(planned.body);
  const sources = [followThrough?.from, followThrough?.second?.from].map((id) => (id === undefined ? undefined : answers.get(id)));
  const isCharged = (cost: 'unitCost' | 'signCost'): boolean =>
    [...answers.values()].some(({ item: other, numbers }) => (plan.items.get(other)?.at ?? Infinity) < planned.at && Number(numbers?.[cost] ?? 0) > 0);
  const facts = {
    followed: settledOf(plan, sources[0]),
    second: settledOf(plan, sources[1]),
    isUnitCharged: isCharged('unitCost'),
    isSignCharged: isCharged('signCost'),
    struck,
  };
  const open = sources.flatMap((source) => (source && settledOf(plan, source) === null ? [source.id] : []));
  return { facts, context: contextFor(planned.body, facts), open };
}
