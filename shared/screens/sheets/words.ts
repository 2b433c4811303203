import type { PaperSize } from '../../sheets/geometry';

const count = (n: number): string => n.toLocaleString('en-GB');
const plural = (n: number, one: string, many = `${one}s`): string => `${count(n)} ${n === 1 ? one : many}`;

const papers: Readonly<Record<PaperSize, string>> = { a4: 'A4', letter: 'US Letter' };

/** The words of the sheets screen. */
export const words = {
  title: 'Answer sheets',
  lead: 'Double-sided sheets for each candidate, which the scanner can tell apart.',
  notAllowed: 'Answer sheets are printed by a lead.',
  papers,
  paperSize: 'Paper',
  paperNotes: { a4: '210 by 297 mm', letter: '8½ by 11 inches' },
  carries: 'Each page carries six codes, the candidate’s number in clear, and framed boxes. Page 1 has a box to write the number in. No name is printed.',
  noItems: 'The paper has no item yet. Sheets are made of its items, so begin with the paper.',
  toPaper: 'To the paper',
  preview: {
    show: 'See one sheet',
    back: 'Back to the settings',
    of: (owner: string) => `As it will be printed for ${owner}`,
    spare: 'a spare sheet',
    page: (page: number, of: number) => `Page ${page} of ${of}`,
    spoken: (page: number, of: number, owner: string) => `Page ${page} of ${of} of the answer sheets, as printed for ${owner}`,
    next: 'Next page',
    previous: 'Previous page',
  },
  whom: {
    label: 'For whom',
    all: (n: number) => `Everyone without a page in: ${count(n)}`,
    withoutSheet: (n: number) => `Only those without a sheet: ${count(n)}`,
  },
  spares: {
    label: 'Spare sheets',
    help: 'Without a number, for whoever is not on the list. They are told apart too.',
    refused: 'A whole number, 500 at most.',
  },
  amount: {
    head: 'What will be made',
    candidates: (n: number) => plural(n, 'candidate'),
    spares: (n: number) => plural(n, 'spare'),
    pages: (n: number) => plural(n, 'page'),
    each: (pages: number, items: number) => `${plural(items, 'answer box', 'answer boxes')} on ${plural(pages, 'page')}: ${plural(pages / 2, 'sheet')} of paper each, printed on both sides`,
    paper: (sheets: number, size: PaperSize) => `${plural(sheets, 'sheet')} of ${papers[size]} in all`,
    pagesIn: (n: number) => (n === 1 ? 'One candidate is left out: a page of theirs is in already.' : `${count(n)} candidates are left out: pages of theirs are in already.`),
    away: (n: number) => (n === 1 ? 'One candidate is left out: absent, withdrawn or deferred.' : `${count(n)} candidates are left out: absent, withdrawn or deferred.`),
  },
  nobody: 'Nobody is on the class list yet. Add candidates, or print spare sheets only.',
  toClassList: 'To the class list',
  open: {
    text: 'The paper is open to change. Printing locks the paper.',
    lock: 'Lock the paper',
    title: 'Lock the paper for printing?',
    freezes: 'Items, keys, roundings and bands can no longer be changed. From then on a key changes by an amendment, for everyone.',
    regions: 'Regions need not be drawn: printed sheets bring their own.',
    cancel: 'Keep it open',
    needed: 'Lock the paper first.',
  },
  make: 'Make the PDF',
  nothing: 'There is nobody to print for.',
  wait: 'Sheets are being made.',
  again: (layout: number) => `Printed again, pages say layout ${layout} and earlier ones keep their number. Take earlier sheets back, so that nobody writes on two.`,
  history: {
    head: 'Printed',
    none: 'Nothing has been printed yet.',
    name: (layout: number, size: PaperSize) => `Layout ${layout}, ${papers[size]}`,
    what: (candidates: number, spares: number, pages: number) => [candidates > 0 ? plural(candidates, 'candidate') : '', spares > 0 ? plural(spares, 'spare') : '', `${plural(pages, 'page')} each`].filter((part) => part !== '').join(', '),
    made: (when: string, who: string) => `${when}, by ${who}`,
    done: (done: number, of: number) => `${count(done)} of ${count(of)} made`,
    making: 'sheets made',
    failed: 'This file could not be made. Its sheets have not been printed; print again.',
    download: 'Download',
    downloadOf: (layout: number, weight: string) => `Download layout ${layout}, ${weight}`,
  },
} as const;
