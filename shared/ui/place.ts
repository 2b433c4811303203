import type { IconName } from './icon';

/** Somewhere one can go: a line of the rail, a place of the bar at the foot. */
export interface Place {
  readonly label: string;
  readonly href: string;
  readonly icon: IconName;
  readonly isChosen: boolean;
  /** What waits there. */
  readonly count?: number | undefined;
}
