import type { Place } from '../../ui/place';

/** Where one can go outside a sitting. */
export const homePlaces = (chosen: 'bench' | 'settings'): Place[] => [
  { label: 'Bench', href: '/', icon: 'bench', isChosen: chosen === 'bench' },
  { label: 'Settings', href: '/settings', icon: 'settings', isChosen: chosen === 'settings' },
];
