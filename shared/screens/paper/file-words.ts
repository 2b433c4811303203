import type { QtiLeavesOut } from '../../marking/qti-leaves-out';

const many = (count: number, one: string, more: string): string => (count === 1 ? one : `${count} ${more}`);

const parts: Readonly<Record<QtiLeavesOut, string>> = {
  'follow-through': 'follow-through',
  'method-marks': 'method marks',
  'unit-cost': 'what a unit costs',
  'sign-cost': 'what a sign costs',
};

/** The words of files that come and go beside the JSON one. */
export const fileWords = {
  takeQti: 'Take from QTI 3.0',
  leftOut: (items: readonly { readonly number: number; readonly parts: readonly QtiLeavesOut[] }[]) => `QTI leaves out ${items.map(({ number, parts: out }) => `of item ${number}: ${out.map((part) => parts[part]).join(', ')}`).join('; ')}.`,
  noPaper: 'The paper as it is now did not come.',
  reading: 'Reading the package',
  comesIn: (count: number) => (count === 0 ? 'Nothing of it can come in.' : `${many(count, 'One item comes', 'items come')} in:`),
  item: (label: string, marks: string) => `${label} [${marks}]`,
  ownKey: 'Written here: its key is worked anew.',
  typedKey: (identifier: string) => `From elsewhere (${identifier}): its key is taken as typed.`,
  refused: (count: number) => `${many(count, 'One is', 'are')} refused:`,
  refusal: (file: string, message: string) => `${file === '' ? 'A resource without a file' : file}: ${message}`,
  giveWay: (items: number) => (items === 0 ? 'The paper has no item yet.' : `${items === 1 ? 'The item' : `The ${items} items`} of this paper and ${items === 1 ? 'its' : 'their'} answer boxes give way.`),
  confirmAll: 'Take it',
  confirmRest: (count: number) => `Take the ${count === 1 ? 'one item that comes' : `${count} items that come`} in`,
};
