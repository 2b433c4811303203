import { isDeepStrictEqual } from 'node:util';
import { itemDraft, type ItemDraft } from '../../../shared/contracts/items';
import { readDraft } from '../drafts/read-draft';
import { proposedPrompt } from '../drafts/asked-of';
import { carriedAttribute } from '../qti-carried';
import { qtiItem } from '../qti-item';
import { below, elementsOf, readXml, textOf, type XmlElement } from './read-xml';
import { ItemRefusal } from './refusal';

const carriers = ['qti-text-entry-interaction', 'qti-choice-interaction', 'qti-order-interaction'];

/** The interaction that carries an item of ours; null in an item from elsewhere. */
export const carrierOf = (item: XmlElement): XmlElement | null => carriers.flatMap((name) => below(item, name)).find(({ attributes }) => attributes[carriedAttribute] !== undefined) ?? null;

const scored = ['qti-response-declaration', 'qti-outcome-declaration', 'qti-response-processing'];

/** Without the space between elements, which says nothing. */
const plain = ({ name, attributes, children }: XmlElement): unknown => [name, attributes, children.flatMap((child) => (typeof child === 'string' ? (child.trim() === '' ? [] : [child.trim()]) : [plain(child)]))];

const scoringOf = (item: XmlElement): unknown => elementsOf(item).filter(({ name }) => scored.includes(name)).map(plain);

function carriedDraft(text: string): ItemDraft {
  let sent: unknown;
  try {
    sent = JSON.parse(text);
  } catch {
    throw new ItemRefusal('What it carries of an item written here is not JSON.');
  }
  const whole = typeof sent === 'object' && sent !== null && 'prompt' in sent && sent.prompt === '' ? { ...sent, prompt: '-' } : sent;
  const parsed = itemDraft.safeParse(whole);
  if (!parsed.success) throw new ItemRefusal(`What it carries of an item written here is not as it was: ${parsed.error.issues[0]?.path.join('.') ?? ''}.`);
  return { ...parsed.data, followThrough: null };
}

/**
 * An item that was written here, its key worked anew. Its wording is taken from the body, for that may have been changed
 * elsewhere; a changed key or scoring is refused, because an item here has none but what it works. Throws ItemRefusal.
 */
export function ownItem(item: XmlElement, carrier: XmlElement): ItemDraft {
  const carried = carriedDraft(carrier.attributes[carriedAttribute] ?? '');
  const [body] = below(item, 'qti-item-body');
  const prompt = (body ? below(body, 'p').map(textOf)[0] ?? '' : '').trim();
  const { scheme, refusals } = readDraft({ ...carried, prompt: prompt === '' ? null : prompt });
  if (!scheme) throw new ItemRefusal(refusals[0]?.message ?? 'Its key cannot be worked.');
  const anew = readXml(Buffer.from(qtiItem({ identifier: 'item', number: 1, prompt, scheme, draft: carried, leftOut: [] })));
  if (!isDeepStrictEqual(scoringOf(item), scoringOf(anew))) throw new ItemRefusal('Its key or scoring is not the one that is worked here: it was changed since it was written.');
  if (prompt === '') throw new ItemRefusal('Its body has no words.');
  return { ...carried, prompt: carried.prompt === null && prompt === proposedPrompt(scheme) ? null : prompt };
}
