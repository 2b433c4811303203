import { groupingSlips } from './grouping';
import { innerElectronSlips } from './inner-electrons';
import { lastStepSlips } from './last-step';
import type { Slip } from './method';
import { otherSpeciesSlips } from './other-species';
import { ownGroupSlips } from './own-group';

/** Every wrong method that leads to a value of its own. Our list, from common practice in marking; no source. */
export const slipCatalogue: readonly Slip[] = [...ownGroupSlips, ...innerElectronSlips, ...groupingSlips, ...lastStepSlips, ...otherSpeciesSlips];
