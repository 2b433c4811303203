import type { ItemDraft } from '../../shared/contracts/items';
import type { SentLayout } from '../../shared/contracts/layouts';
import type { Actor } from '../../server/auth/access';
import { importClassList } from '../../server/services/class-list';
import { createItem } from '../../server/services/items';
import { saveLayout } from '../../server/services/layouts';
import { lockPaper } from '../../server/services/paper-lock';
import { createSitting } from '../../server/services/sittings';
import type { CastName } from './cast';
import type { TestServer } from './test-server';

/** A sound item: 3 marks, key and one-decimal roundings, no band. */
export const itemDraft = (symbol = 'Cl', electron = '3p', changes: Partial<ItemDraft> = {}): ItemDraft => ({
  kind: 'numeric',
  asked: { symbol, charge: 0, electron, quantity: 'zeff', convention: 'slater' },
  printed: null,
  decimals: 2,
  figures: 4,
  prompt: null,
  marks: '3',
  roundings: { downToDecimals: 1, truncation: false },
  bands: [],
  alternatives: [],
  slips: [],
  followThrough: null,
  methodMarks: [],
  unitCost: null,
  signCost: null,
  crossedOut: 'ask',
  twoAnswers: 'ask',
  ...changes,
});

export const actorOf = (server: TestServer, name: CastName): Actor => ({ personId: server.people[name], isOfficer: name === 'officer' });

/** One page with an answer box an item, one under the other; twelve at most. */
export const layoutFor = (items: readonly string[]): SentLayout => ({
  pages: [{ widthMm: 210, heightMm: 297 }],
  boxes: items.map((item, index) => ({ pageNo: 1, item, use: 'answer', x: 120, y: 20 + index * (items.length > 10 ? 22 : 25), w: 60, h: 18 })),
});

export interface BuiltPaper {
  readonly sittingId: string;
  readonly items: readonly string[];
}

/** An item as it is, or by the ids of those before it, from which it may follow. */
export type WantedItem = ItemDraft | ((earlier: readonly string[]) => ItemDraft);

interface Wanted {
  readonly drafts?: readonly WantedItem[];
  readonly candidates?: readonly string[];
  readonly locked?: boolean;
}

/** A sitting of the cast's course with a paper, a layout and a class list; locked unless said otherwise. */
export function buildPaper(server: TestServer, { drafts = [itemDraft(), itemDraft('Fe', '4s')], candidates = ['W4071', 'W4072', 'W4073'], locked = true }: Wanted = {}): BuiltPaper {
  const { context } = server;
  const lead = actorOf(server, 'lead');
  const sitting = createSitting(context, lead, server.courseId, { title: 'Paper 2, spring sitting', heldOn: '2026-05-06', secondPolicy: 'none', totalRounding: 'none' });
  const items: string[] = [];
  for (const draft of drafts) items.push(createItem(context, lead, sitting.id, typeof draft === 'function' ? draft(items) : draft).id);
  saveLayout(context, lead, sitting.id, 0, layoutFor(items));
  if (candidates.length > 0) importClassList(context, lead, sitting.id, candidates.join('\n'));
  if (locked) lockPaper(context, lead, sitting.id);
  return { sittingId: sitting.id, items };
}
