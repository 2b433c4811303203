import type { ProgressView } from '../../contracts/progress';
import type { SittingView } from '../../contracts/sittings';
import type { BuretteStage } from '../../ui/burette';
import { buretteLevel } from '../../ui/burette-geometry';

export const sections = ['paper', 'regions', 'class-list'] as const;
export type Section = (typeof sections)[number];

const labels: Record<Section, string> = { paper: 'Paper', regions: 'Regions', 'class-list': 'Class list' };

const candidatesIn = (progress: ProgressView): number => Object.values(progress.candidates).reduce((sum, count) => sum + count, 0);

function noteOf(section: Section, progress: ProgressView): string {
  if (section === 'paper') return progress.isLocked ? `locked, ${progress.items} items` : `open to change, ${progress.items} items`;
  if (section === 'regions') return `${progress.itemsPlaced} of ${progress.items} items placed`;
  return `${candidatesIn(progress)} candidates`;
}

const readingNote = ({ readings, answers }: ProgressView): string => (readings.taken === 0 ? 'not begun' : `${readings.taken} taken, ${answers.all} answers`);

/** The sections of a sitting for the burette, and the reading that follows them; keys and regions are the lead's and the external examiner's to see. */
export function stagesOf(sitting: Pick<SittingView, 'id' | 'roles'>, progress: ProgressView | undefined, chosen: Section | null): BuretteStage[] {
  const seesPaper = sitting.roles.includes('lead') || sitting.roles.includes('external');
  const seesList = seesPaper || sitting.roles.includes('reader');
  const isOpen = (section: Section): boolean => (section === 'class-list' ? seesList : seesPaper);
  const stages: BuretteStage[] = sections.map((section) => ({
    label: labels[section],
    note: progress ? noteOf(section, progress) : '',
    isChosen: section === chosen,
    ...(isOpen(section) ? { href: `/sittings/${sitting.id}/${section}` } : {}),
  }));
  // A stage without a screen: it keeps the burette from standing empty while nothing has been read.
  return [...stages, { label: 'Reading', note: progress ? readingNote(progress) : '' }];
}

/** Finished sections plus the finished part of the first unfinished one. */
export function levelOf(progress: ProgressView | undefined): number {
  if (!progress) return 0;
  const shares = [progress.isLocked ? 1 : 0, progress.items === 0 ? 0 : progress.itemsPlaced / progress.items, candidatesIn(progress) > 0 ? 1 : 0, progress.answers.all === 0 ? 0 : progress.readings.taken / progress.answers.all];
  return buretteLevel(shares);
}
