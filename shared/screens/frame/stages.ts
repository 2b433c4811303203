import type { ProgressView } from '../../contracts/progress';
import type { SittingView } from '../../contracts/sittings';
import type { BuretteStage } from '../../ui/burette';
import { buretteLevel } from '../../ui/burette-geometry';
import type { IconName } from '../../ui/icon';

export const sections = ['paper', 'regions', 'class-list', 'sheets', 'scans', 'reading', 'moderation', 'marks'] as const;
export type Section = (typeof sections)[number];
type Roles = SittingView['roles'];

const count = (n: number): string => n.toLocaleString('en-GB');
const candidatesIn = (progress: ProgressView): number => Object.values(progress.candidates).reduce((sum, each) => sum + each, 0);
const share = (part: number, whole: number): number => (whole === 0 ? 0 : part / whole);

interface Described {
  readonly label: string;
  readonly icon: IconName;
  readonly who: Roles;
  readonly note: (progress: ProgressView) => string;
  /** How much of it is done, 0 to 1. */
  readonly done: (progress: ProgressView) => number;
}

const described: Readonly<Record<Section, Described>> = {
  paper: {
    label: 'Paper',
    icon: 'note',
    who: ['lead', 'external'],
    note: ({ isLocked, items }) => (isLocked ? `locked, ${items} items` : `open to change, ${items} items`),
    done: ({ isLocked }) => (isLocked ? 1 : 0),
  },
  regions: {
    label: 'Regions',
    icon: 'page',
    who: ['lead', 'external'],
    note: ({ itemsPlaced, items }) => `${itemsPlaced} of ${items} items placed`,
    done: ({ itemsPlaced, items }) => share(itemsPlaced, items),
  },
  'class-list': {
    label: 'Class list',
    icon: 'people',
    who: ['lead', 'reader', 'external'],
    note: (progress) => `${count(candidatesIn(progress))} candidates`,
    done: (progress) => (candidatesIn(progress) > 0 ? 1 : 0),
  },
  sheets: {
    label: 'Sheets',
    icon: 'print',
    who: ['lead', 'external'],
    note: (progress) => (progress.sheetsPrinted === 0 ? 'none printed' : `${count(progress.sheetsPrinted)} of ${count(candidatesIn(progress))} printed`),
    // Papers of one's own need no printed sheets: either way it is known where the answers stand.
    done: ({ itemsPlaced, items }) => (items > 0 && itemsPlaced === items ? 1 : 0),
  },
  scans: {
    label: 'Scans',
    icon: 'tray',
    who: ['lead', 'reader', 'external'],
    note: ({ pages }) => (pages.loose > 0 ? `${count(pages.in)} of ${count(pages.due)}, ${count(pages.loose)} loose` : `${count(pages.in)} of ${count(pages.due)} pages`),
    done: ({ pages }) => share(pages.in, pages.due),
  },
  reading: {
    label: 'Reading',
    icon: 'desk',
    who: ['lead', 'reader'],
    note: ({ readings }) => (readings.taken === 0 && readings.due === 0 ? 'not begun' : `${count(readings.taken)} of ${count(readings.taken + readings.due)}`),
    done: ({ readings }) => share(readings.taken, readings.taken + readings.due),
  },
  moderation: {
    label: 'Moderation',
    icon: 'moderation',
    who: ['lead', 'external'],
    note: ({ answers }) => (answers.held === null ? '' : answers.held === 0 ? 'nothing to rule' : `${count(answers.held)} to rule`),
    done: ({ answers }) => share(answers.scored ?? 0, answers.readable),
  },
  marks: {
    label: 'Marks',
    icon: 'check',
    who: ['lead', 'external'],
    note: ({ answers }) => (answers.scored === null ? '' : `${count(answers.scored)} of ${count(answers.all)} answers`),
    done: ({ answers }) => share(answers.scored ?? 0, answers.all),
  },
};

/** Where a section is. The desk stands outside a sitting's frame: it has the screen to itself. */
export const hrefOf = (sittingId: string, section: Section): string => (section === 'reading' ? `/desk/${sittingId}` : `/sittings/${sittingId}/${section}`);

export const iconOf = (section: Section): IconName => described[section].icon;

/** The sections of a sitting, top to bottom of its burette; those a person may go to have their address. */
export function stagesOf(sitting: Pick<SittingView, 'id' | 'roles'>, progress: ProgressView | undefined, chosen: Section | null): (BuretteStage & { readonly section: Section })[] {
  return sections.map((section) => {
    const { label, who, note } = described[section];
    return {
      section,
      label,
      note: progress ? note(progress) : '',
      isChosen: section === chosen,
      ...(who.some((role) => sitting.roles.includes(role)) ? { href: hrefOf(sitting.id, section) } : {}),
    };
  });
}

/** Finished sections plus the finished part of the first unfinished one. */
export const levelOf = (progress: ProgressView | undefined): number => (progress ? buretteLevel(sections.map((section) => described[section].done(progress))) : 0);
