import { itemDraft, type ItemDraft } from '../../../shared/contracts/items';
import type { FileItem, QtiReading } from '../../../shared/contracts/paper-file';
import { itemLabel } from '../../../shared/marking/item-label';
import { invalidRequest } from '../../errors';
import { proposedPrompt } from '../drafts/asked-of';
import { readDraft } from '../drafts/read-draft';
import { foreignItem } from './foreign-item';
import { carrierOf, ownItem } from './own-item';
import { below, readXml, XmlRefusal, type XmlElement } from './read-xml';
import { ItemRefusal } from './refusal';
import { unpack } from './unpack';

const manifestName = 'imsmanifest.xml';
const itemType = /^imsqti_item_xmlv3p0$/;
const mostItems = 200;

export interface ReadPackage {
  readonly reading: QtiReading;
  /** One for each of `reading.items`. */
  readonly items: readonly FileItem[];
}

function manifestOf(files: ReadonlyMap<string, Uint8Array>): XmlElement {
  const bytes = files.get(manifestName);
  if (!bytes) throw invalidRequest(`The package was not read. It has no ${manifestName}.`);
  try {
    const root = readXml(bytes);
    if (root.name === 'manifest') return root;
  } catch (error) {
    if (!(error instanceof XmlRefusal)) throw error;
    throw invalidRequest(`${manifestName}: ${error.message}`, { [manifestName]: error.message });
  }
  throw invalidRequest(`The package was not read. ${manifestName} is no manifest.`);
}

interface ReadItem {
  readonly identifier: string;
  readonly draft: ItemDraft;
  readonly isOwn: boolean;
}

/** The item of one resource of the manifest. Throws ItemRefusal or XmlRefusal. */
function itemOf(files: ReadonlyMap<string, Uint8Array>, { attributes }: XmlElement): ReadItem {
  const { type = '', href = '' } = attributes;
  if (!itemType.test(type)) throw new ItemRefusal(`It is of the type “${type.slice(0, 40)}”; only items of QTI 3.0 are read.`);
  const bytes = files.get(href);
  if (!bytes) throw new ItemRefusal('The package does not hold its file.');
  const root = readXml(bytes);
  if (root.name !== 'qti-assessment-item') throw new ItemRefusal(`It is <${root.name.slice(0, 40)}>, not an item of QTI 3.0.`);
  const identifier = (root.attributes['identifier'] ?? '').trim().slice(0, 200);
  if (identifier === '') throw new ItemRefusal('It has no identifier.');
  const carrier = carrierOf(root);
  const sent = carrier ? ownItem(root, carrier) : foreignItem(root, identifier);
  const parsed = itemDraft.safeParse(sent);
  if (!parsed.success) throw new ItemRefusal(parsed.error.issues[0]?.message ?? 'It cannot be read.');
  const { scheme, refusals, problems } = readDraft(parsed.data);
  const [first] = [...refusals, ...(carrier ? [] : problems)];
  if (!scheme || first) throw new ItemRefusal(first?.message ?? 'Its key cannot be worked.');
  return { identifier, draft: parsed.data, isOwn: carrier !== null };
}

function lineOf({ identifier, draft, isOwn }: ReadItem, file: string): QtiReading['items'][number] {
  const { scheme } = readDraft(draft);
  const prompt = draft.prompt ?? (scheme ? proposedPrompt(scheme) : '');
  return { file, identifier, label: scheme ? itemLabel(scheme) : '', kind: draft.kind, marks: draft.marks, prompt, isOwn };
}

/** What a package brings, in the order of its manifest, and what of it is refused. Throws where it cannot be read at all. */
export function readPackage(bytes: Uint8Array): ReadPackage {
  const files = unpack(bytes);
  const items: FileItem[] = [];
  const reading: QtiReading = { items: [], refused: [] };
  const resources = below(manifestOf(files), 'resource');
  if (resources.length > mostItems) throw invalidRequest(`The package was not read. A paper has at most ${mostItems} items.`);
  for (const resource of resources) {
    const { href = '', identifier = '' } = resource.attributes;
    const [file, named] = [href.slice(0, 200), identifier.slice(0, 200)];
    try {
      const read = itemOf(files, resource);
      items.push({ ...read.draft, followThrough: null });
      reading.items.push(lineOf(read, file));
    } catch (error) {
      if (!(error instanceof ItemRefusal || error instanceof XmlRefusal)) throw error;
      reading.refused.push({ file, identifier: named, message: error.message });
    }
  }
  return { reading, items };
}
