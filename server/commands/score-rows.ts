import { paperFile } from '../../shared/contracts/paper-file';
import { marksText } from '../../shared/marking/grains';
import { readAnswer } from '../../shared/marking/read-answer';
import { codes, emptyContext, type Given, type ItemScheme } from '../../shared/marking/scheme';
import { markAnswer } from '../../shared/marking/verdict';
import { readDraft } from '../services/item-drafts';
import type { Row } from './key-rows';

/** The schemes of a paper file, in its order. Throws one sentence for each item that cannot be worked. */
export function schemesOf(json: string): ItemScheme[] {
  const file = paperFile.safeParse(JSON.parse(json));
  if (!file.success) throw new Error(file.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`).join('\n'));
  const problems: string[] = [];
  const schemes = file.data.items.flatMap((draft, index) => {
    const { scheme, refusals, problems: locked } = readDraft(draft);
    const [wrong] = [...refusals, ...locked];
    if (wrong) problems.push(`Item ${index + 1}, ${wrong.path}: ${wrong.message}`);
    return scheme ? [scheme] : [];
  });
  if (problems.length > 0) throw new Error(problems.join('\n'));
  return schemes;
}

/** `@blank` is the code blank; anything else is a text as it was typed. */
function givenBy(text: string): Given | string {
  if (!text.startsWith('@')) return { text };
  const code = codes.find((known) => `@${known}` === text);
  return code ? { code } : `text: “${text}” is no code. Codes: ${codes.map((known) => `@${known}`).join(', ')}.`;
}

/** One row marked: what was understood, mark, whole, the rule and the slips that fit; an error leaves the mark empty. */
export function scoreRow(schemes: readonly ItemScheme[], row: Row): Row {
  const { candidate = '', item = '', text = '' } = row;
  const own = { candidate, item, text };
  const refused = (error: string): Row => ({ ...own, parsed: '', mark: '', max: '', rule: '', slips: '', error });
  const scheme = /^\d+$/.test(item) ? schemes[Number(item) - 1] : undefined;
  if (!scheme) return refused(`item: the paper has no item ${item}.`);
  const given = givenBy(text);
  if (typeof given === 'string') return refused(given);
  const max = marksText(scheme.maxGrains);
  if ('text' in given) {
    const read = readAnswer(given.text, scheme.units);
    if (!read.ok) return { ...refused(`text: ${read.unfinished ? 'not yet a value.' : read.message}`), max };
    const { grains, rule, numbers } = markAnswer(scheme, given, emptyContext);
    return { ...own, parsed: read.canonical, mark: grains === null ? '' : marksText(grains), max, rule, slips: numbers.slips ?? '', error: '' };
  }
  const { grains, rule } = markAnswer(scheme, given, emptyContext);
  return { ...own, parsed: '', mark: grains === null ? '' : marksText(grains), max, rule, slips: '', error: '' };
}
