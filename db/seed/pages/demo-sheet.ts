import { GRAINS_PER_MARK } from '../../../shared/marking/grains';
import { demoItems, promptOf } from '../truth/demo-items';
import type { PrintedSheet } from './printed';

/** The answer paper of the demo's sitting. */
export const demoSheet: PrintedSheet = {
  title: 'CHM 214, Paper 2',
  lines: ['University of Wrenmoor', 'spring sitting, 6 May'],
  items: demoItems.map((item) => ({ number: item.number, marks: item.maxGrains / GRAINS_PER_MARK, prompt: promptOf(item) })),
};
