import { useId, useState } from 'react';
import { View } from 'react-native';
import { BuretteTube } from './burette-tube';
import { CurveUnderline } from './curve-underline';
import { Link } from './link';
import { Popover } from './popover';
import { Pressable } from './pressable';
import { Text } from './text';
import { useColors } from './theme';
import { radius, size } from './tokens';

export interface BuretteStage {
  readonly label: string;
  /** How it stands, in a word or two. */
  readonly note: string;
  /** Left out where the person may not go there. */
  readonly href?: string | undefined;
  readonly isChosen?: boolean | undefined;
}

export interface BuretteProps {
  readonly stages: readonly BuretteStage[];
  /** In stages, see buretteLevel. */
  readonly level: number;
  readonly isClosed?: boolean | undefined;
}

const step = 72;
const left = 18;

/** The burette at the left of a wide screen, 200 wide: its graduations are the sections, each leads there. */
export function Burette({ stages, level, isClosed }: BuretteProps) {
  return (
    <View style={{ flexDirection: 'row', width: size.column }}>
      <View style={{ width: 48 }}>
        <BuretteTube stages={stages.length} level={level} step={step} left={left} isClosed={isClosed} />
      </View>
      <View role="list" style={{ flex: 1, minWidth: 0, paddingTop: 26, paddingRight: 8 }}>
        {stages.map((stage) => (
          <View key={stage.label} role="listitem" style={{ height: step, justifyContent: 'center' }}>
            <StageLine stage={stage} />
          </View>
        ))}
      </View>
    </View>
  );
}

function StageWords({ stage }: { stage: BuretteStage }) {
  return (
    <>
      <View style={{ alignSelf: 'flex-start', maxWidth: '100%' }}>
        <Text variant="body" weight={stage.isChosen ? 600 : 500} lines={1}>
          {stage.label}
        </Text>
        {stage.isChosen ? <CurveUnderline /> : null}
      </View>
      <Text variant="label" weight={400} tone="ink2" lines={2}>
        {stage.note}
      </Text>
    </>
  );
}

function StageLine({ stage }: { stage: BuretteStage }) {
  const colors = useColors();
  if (stage.href === undefined) {
    return (
      <View style={{ paddingHorizontal: 6 }}>
        <StageWords stage={stage} />
      </View>
    );
  }
  return (
    <Link href={stage.href} isCurrent={stage.isChosen} isFocusInside style={({ isHovered }) => ({ minHeight: size.touch, justifyContent: 'center', paddingHorizontal: 6, borderRadius: radius.control, backgroundColor: isHovered ? colors.well : 'transparent' })}>
      <StageWords stage={stage} />
    </Link>
  );
}

/** The same, 64 wide, beside a scan or a sheet: tube and triangle, its sections in a menu. */
export function BuretteSlim({ stages, level, isClosed, stepHeight = step }: BuretteProps & { stepHeight?: number }) {
  const [isOpen, setOpen] = useState(false);
  const menu = useId();
  const here = stages.find(({ isChosen }) => isChosen)?.label ?? '';
  return (
    <View style={{ width: size.columnSlim, alignItems: 'center' }}>
      <Pressable onPress={() => setOpen(!isOpen)} isExpanded={isOpen} controls={menu} label={`Sections${here === '' ? '' : `, ${here} is open`}`} isFocusInside style={() => ({ borderRadius: radius.control })}>
        <BuretteTube stages={stages.length} level={level} step={stepHeight} isClosed={isClosed} isPointed />
      </Pressable>
      {isOpen ? (
        <Popover id={menu} label="Sections" onClose={() => setOpen(false)} style={{ left: size.columnSlim - 4, top: 12, width: 220 }}>
          {stages.map((stage) => (
            <View key={stage.label} style={{ minHeight: 56, justifyContent: 'center' }}>
              <StageLine stage={stage} />
            </View>
          ))}
        </Popover>
      ) : null}
    </View>
  );
}
