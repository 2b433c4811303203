import { usePathname } from 'expo-router';
import type { ReactNode } from 'react';
import { useProgress, useSitting } from '../client/sittings';
import { Burette, BuretteSlim } from '../ui/burette';
import type { Place } from '../ui/place';
import { ScreenFrame } from '../ui/screen-frame';
import { iconOf, levelOf, sections, stagesOf, type Section } from './frame/stages';

interface InSittingProps {
  readonly sittingId: string;
  readonly children: ReactNode;
  /** The screen scrolls its own parts. */
  readonly isFixed?: boolean;
  /** A scan or a sheet needs the room. */
  readonly isSlim?: boolean;
  /** A desk or a form has the foot of a phone to itself. */
  readonly isBarHidden?: boolean;
  /** A sheet beside the content on wide. */
  readonly side?: ReactNode;
}

/** On a phone four sections stand at the foot beside the overview, the work before the building. */
const atFoot: readonly Section[] = ['reading', 'moderation', 'marks', 'scans', 'paper', 'class-list', 'sheets', 'regions'];

const sectionOf = (path: string): Section | null => (path.startsWith('/desk/') || path.endsWith('/blanks') ? 'reading' : /\/(sorting|people|numbers|by-hand)$/.test(path) ? 'scans' : path.endsWith('/vetting') ? 'paper' : (sections.find((section) => path.endsWith(`/${section}`)) ?? null));

/** What stands round every screen of a sitting: its burette at the left of a wide screen, its places at the foot of a phone. */
export function InSitting({ sittingId, children, isFixed = false, isSlim = false, isBarHidden = false, side }: InSittingProps) {
  const path = usePathname();
  const chosen = sectionOf(path);
  const { data: sitting } = useSitting(sittingId);
  const { data: progress } = useProgress(sittingId);
  const stages = stagesOf(sitting ?? { id: sittingId, roles: [] }, progress, chosen);
  const overview: Place = { label: 'Overview', href: `/sittings/${sittingId}`, icon: 'overview', isChosen: chosen === null };
  const open = atFoot.flatMap((section): Place[] => {
    const stage = stages.find((one) => one.section === section);
    return stage?.href === undefined ? [] : [{ label: stage.label, href: stage.href, icon: iconOf(section), isChosen: section === chosen }];
  });
  const places: Place[] = [{ label: 'Bench', href: '/', icon: 'bench', isChosen: false }, overview, ...open.slice(0, 3)];
  const name = stages.find((stage) => stage.isChosen)?.label ?? overview.label;
  const rail = isSlim ? <BuretteSlim stages={stages} level={levelOf(progress)} /> : <Burette stages={stages} level={levelOf(progress)} />;
  return (
    <ScreenFrame name={sitting ? `${name}, ${sitting.courseCode}` : name} isHeadHidden isFixed={isFixed} places={places} rail={rail} isRailSlim={isSlim} isBarHidden={isBarHidden} side={side}>
      {children}
    </ScreenFrame>
  );
}
