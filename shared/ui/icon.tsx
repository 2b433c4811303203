import Svg, { Path } from 'react-native-svg';
import { useColors } from './theme';
import type { ColorRole } from './tokens';

/** Outlines on a 20 by 20 field. */
const paths = {
  back: 'M12.5 4 6.5 10l6 6',
  forward: 'M7.5 4l6 6-6 6',
  up: 'M4 12.5l6-6 6 6',
  down: 'M4 7.5l6 6 6-6',
  close: 'M5 5l10 10M15 5 5 15',
  turn: 'M15.5 7.5A6.3 6.3 0 1 0 16.3 11M15.8 3.6v4h-4',
  page: 'M5 2.5h7l3 3v12H5zM12 2.5v3h3',
  closer: 'M8.5 3.2a5.3 5.3 0 1 1 0 10.6 5.3 5.3 0 0 1 0-10.6M12.4 12.4 17 17M6.2 8.5h4.6M8.5 6.2v4.6',
  find: 'M8.5 3.2a5.3 5.3 0 1 1 0 10.6 5.3 5.3 0 0 1 0-10.6M12.4 12.4 17 17',
  takeBack: 'M4 8.5h8a4 4 0 0 1 0 8H8M7.2 5 3.8 8.5 7.2 12',
  delete: 'M7 4.5h10v11H7L2.5 10zM10 8l4 4M14 8l-4 4',
  enter: 'M16 4.5v6H4.5M8 7 4.5 10.5 8 14',
  filter: 'M3.5 3.5h13l-5 6.5v6.5l-3-1.6V10z',
  keys: 'M2.5 5.5h15v9h-15zM5.5 8.5h.01M8.5 8.5h.01M11.5 8.5h.01M14.5 8.5h.01M6.5 11.6h7',
  tray: 'M2.5 11.5h4l1.2 2.2h4.6l1.2-2.2h4v5h-15zM5 11V4h10v7M7.5 7h5',
  people: 'M7.5 9a2.8 2.8 0 1 0 0-5.6 2.8 2.8 0 0 0 0 5.6M2.5 16.5c0-3 2.2-5 5-5s5 2 5 5M12.5 3.7a2.7 2.7 0 0 1 0 5M14 11.8c2 .6 3.5 2.4 3.5 4.7',
  trail: 'M4 4.5h.01M4 10h.01M4 15.5h.01M7.5 4.5h9M7.5 10h9M7.5 15.5h6',
  settings: 'M3 6h6M13 6h4M3 14h3M10 14h7M11 4v4M8 12v4',
  plus: 'M10 4v12M4 10h12',
  check: 'M4 10.5l4 4 8-9',
  warning: 'M10 3 18 16.5H2zM10 8v4M10 14.2v.01',
  note: 'M4 3.5h12v9l-4 4H4zM12 16.5v-4h4M7 7.5h6M7 10.5h3',
  eye: 'M2 10s3-5 8-5 8 5 8 5-3 5-8 5-8-5-8-5M10 8a2 2 0 1 1 0 4 2 2 0 0 1 0-4',
  calendar: 'M3.5 4.5h13v12h-13zM3.5 8.5h13M7 2.5v3M13 2.5v3',
  print: 'M5.5 7V3h9v4M3 7h14v7h-2.5M5.5 14H3V7M5.5 11.5h9v5.5h-9z',
  sun: 'M10 6.5a3.5 3.5 0 1 1 0 7 3.5 3.5 0 0 1 0-7M10 2v1.6M10 16.4V18M2 10h1.6M16.4 10H18M4.3 4.3l1.2 1.2M14.5 14.5l1.2 1.2M4.3 15.7l1.2-1.2M14.5 5.5l1.2-1.2',
  overview: 'M2.5 13.5h15M4 13.5v-3M7 13.5v-5M10 13.5V6M13 13.5v-5M16 13.5v-3',
  hand: 'M3 14.5c3 2.5 8 2 9.5-1L17 5.5 15 4l-5 7M10 11 6 9',
  more: 'M4 10h.01M10 10h.01M16 10h.01',
  farther: 'M8.5 3.2a5.3 5.3 0 1 1 0 10.6 5.3 5.3 0 0 1 0-10.6M12.4 12.4 17 17M6.2 8.5h4.6',
  bench: 'M3 16.5h14M5 16.5V6.5M15 16.5V6.5M3 6.5h14M8 6.5V3.5h4v3',
  question: 'M10 2.8a7.2 7.2 0 1 1 0 14.4 7.2 7.2 0 0 1 0-14.4M7.8 8.1a2.2 2.2 0 1 1 3.3 1.9c-.8.5-1.1.9-1.1 1.7M10 14.1v.01',
  out: 'M8 3.5H3.5v13H8M12.5 6 16.5 10l-4 4M16.5 10H7.5',
  /** A siphon, from one vessel into the next. */
  follows: 'M4 12V6.5Q4 3.5 7 3.5h5.5q3 0 3 3V15M12.8 12.4l2.7 2.8 2.7-2.8',
  link: 'M7.5 4.5h-4v12h12v-4M11 3.5h5.5V9M16.5 3.5 9 11',
  download: 'M10 3v9.5M6 8.8l4 4 4-4M3.5 16.5h13',
  upload: 'M10 13V3.5M6 7.2l4-4 4 4M3.5 16.5h13',
  camera: 'M3 6h3.2L7.5 4h5l1.3 2H17v10.5H3zM10 8a3.2 3.2 0 1 1 0 6.4A3.2 3.2 0 0 1 10 8',
  moderation: 'M2.5 4.5h8M2.5 8.5h8M2.5 12.5h5M2.5 16.5h5M12.5 6.2q2.2 3 4.5 0M10.5 13q3.2 4 6.5 0',
  desk: 'M4 3.5h12v8H4zM7 6.5q3 3.5 6 0M1.5 7.5 3 6.5v2zM18.5 7.5 17 6.5v2zM7 16.5h6',
  guard: 'M10 2.5 16.5 5v5c0 4-3 6.5-6.5 7.5C6.5 16.5 3.5 14 3.5 10V5zM7 10l2.2 2.2L13 8',
  invert: 'M10 3.2a6.8 6.8 0 1 1 0 13.6 6.8 6.8 0 0 1 0-13.6M10 3.2v13.6M10 6h3.6M10 9h5.4M10 12h5M10 15h3',
} as const;

export type IconName = keyof typeof paths;

interface IconProps {
  readonly name: IconName;
  readonly size?: number | undefined;
  readonly tone?: ColorRole | undefined;
  /** On a ground outside the themes, such as a toast. */
  readonly color?: string | undefined;
}

/** A line icon. It says nothing to a screen reader: the control it stands in has the word. */
export function Icon({ name, size = 20, tone = 'ink2', color }: IconProps) {
  const colors = useColors();
  return (
    <Svg width={size} height={size} viewBox="0 0 20 20" fill="none" aria-hidden>
      <Path d={paths[name]} stroke={color ?? colors[tone]} strokeWidth={name === 'more' ? 2.6 : 1.6} strokeLinecap="round" strokeLinejoin="round" />
    </Svg>
  );
}
