import { usePathname } from 'expo-router';
import type { ReactNode } from 'react';
import { useProgress, useSitting } from '../client/sittings';
import { Burette } from '../ui/burette';
import { ScreenFrame } from '../ui/screen-frame';
import { levelOf, sections, stagesOf } from './frame/stages';

interface InSittingProps {
  readonly sittingId: string;
  readonly children: ReactNode;
  /** The screen scrolls its own parts. */
  readonly isFixed?: boolean;
}

const icons = { paper: 'note', regions: 'page', 'class-list': 'people' } as const;

/** What stands round every screen of a sitting: its burette at the left of a wide screen, its places at the foot of a phone. */
export function InSitting({ sittingId, children, isFixed = false }: InSittingProps) {
  const path = usePathname();
  const chosen = sections.find((section) => path.endsWith(`/${section}`)) ?? null;
  const { data: sitting } = useSitting(sittingId);
  const { data: progress } = useProgress(sittingId);
  const stages = stagesOf(sitting ?? { id: sittingId, roles: [] }, progress, chosen);
  const places = [
    { label: 'Bench', href: '/', icon: 'bench' as const, isChosen: false },
    ...stages.flatMap((stage, index) => {
      const section = sections[index];
      return stage.href && section ? [{ label: stage.label, href: stage.href, icon: icons[section], isChosen: section === chosen }] : [];
    }),
  ];
  const name = stages.find((stage) => stage.isChosen)?.label ?? 'Sitting';
  return (
    <ScreenFrame name={sitting ? `${name}, ${sitting.courseCode}` : name} isHeadHidden isFixed={isFixed} places={places} rail={<Burette stages={stages} level={levelOf(progress)} />}>
      {children}
    </ScreenFrame>
  );
}
