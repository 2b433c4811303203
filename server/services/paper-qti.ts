import { strToU8, zipSync } from 'fflate';
import { create } from 'xmlbuilder2';
import { draftedItems } from '../../db/queries/papers';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { carriedOf } from './qti-carried';
import { qtiItem, type PackedItem } from './qti-item';
import { requireSitting } from './sitting-access';

const packageSpace = 'http://www.imsglobal.org/xsd/qti/qtiv3p0/imscp_v1p1';
const packageSchema = 'https://purl.imsglobal.org/spec/qti/v3p0/schema/xsd/imsqtiv3p0_imscpv1p2_v1p0.xsd';
const instanceSpace = 'http://www.w3.org/2001/XMLSchema-instance';

const pathOf = ({ identifier }: PackedItem): string => `items/${identifier}.xml`;

function manifest(identifier: string, items: readonly PackedItem[]): string {
  const document = create({ version: '1.0', encoding: 'UTF-8' });
  const root = document.ele(packageSpace, 'manifest', { identifier });
  root.att(instanceSpace, 'xsi:schemaLocation', `${packageSpace} ${packageSchema}`);
  const metadata = root.ele('metadata');
  metadata.ele('schema').txt('QTI Package');
  metadata.ele('schemaversion').txt('3.0.1');
  root.ele('organizations');
  const resources = root.ele('resources');
  for (const item of items) {
    const href = pathOf(item);
    resources.ele('resource', { identifier: item.identifier, type: 'imsqti_item_xmlv3p0', href }).ele('file', { href });
  }
  return document.end({ prettyPrint: true });
}

/** The items of a paper as a QTI 3.0 package (1EdTech): a manifest and one file an item, keys and tolerances in it. */
export function paperQti(context: Context, actor: Actor, sittingId: string): { fileName: string; bytes: Buffer } {
  const { sitting } = requireSitting(context, actor, sittingId, ['lead']);
  const paper = `paper-${sitting.printNumber}`;
  const items = draftedItems(context.db, sittingId)
    .flatMap(({ item, scheme }): PackedItem[] => {
      const carried = carriedOf(scheme, item.prompt);
      return carried ? [{ identifier: `${paper}-item-${item.number}`, number: item.number, prompt: item.prompt, ...carried }] : [];
    });
  const files = { 'imsmanifest.xml': strToU8(manifest(paper, items)), ...Object.fromEntries(items.map((item) => [pathOf(item), strToU8(qtiItem(item))])) };
  return { fileName: `${paper}.qti.zip`, bytes: Buffer.from(zipSync(files, { mtime: context.clock.now() })) };
}
