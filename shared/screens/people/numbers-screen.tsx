import { useRef, useState } from 'react';
import { View, type TextInput } from 'react-native';
import { v7 as uuidv7 } from 'uuid';
import { useLookAtPeopleAgain, useNumberStrips, useReadNumber } from '../../client/people-and-paper';
import { useSitting } from '../../client/sittings';
import type { NumberStrip } from '../../contracts/people-and-paper';
import { Button, ButtonLink } from '../../ui/button';
import { Empty } from '../../ui/page-state';
import { Text } from '../../ui/text';
import { useIsPhone } from '../../ui/use-breakpoint';
import { Vessel } from '../../ui/vessel';
import { InSitting } from '../in-sitting';
import { QueryState } from '../query-state';
import { Strip } from './strip';
import { words } from './words';

const w = words.reading;

/** Hand-written candidate numbers, one at a time, without the printed one. */
export function NumbersScreen({ sittingId }: { sittingId: string }) {
  const strips = useNumberStrips(sittingId);
  return (
    <InSitting sittingId={sittingId}>
      <QueryState query={strips} fetching="Fetching numbers to read" failed="The numbers did not come.">
        {(found) => <Numbers key={found.strips[0]?.scriptId ?? 'none'} sittingId={sittingId} strips={found.strips} left={found.left} />}
      </QueryState>
    </InSitting>
  );
}

function Numbers({ sittingId, strips, left }: { sittingId: string; strips: readonly NumberStrip[]; left: number }) {
  const isPhone = useIsPhone();
  const sitting = useSitting(sittingId);
  const read = useReadNumber();
  const lookAgain = useLookAtPeopleAgain(sittingId);
  const field = useRef<TextInput>(null);
  const [at, setAt] = useState(0);
  const [text, setText] = useState('');
  const [underWay, setUnderWay] = useState(0);
  const [refusal, setRefusal] = useState<string | null>(null);
  const strip = strips[at];
  const say = (said: string | null) => {
    if (!strip) return;
    setText('');
    setAt(at + 1);
    setUnderWay((n) => n + 1);
    read
      .mutateAsync({ id: uuidv7(), scriptId: strip.scriptId, text: said })
      .catch((error: Error) => setRefusal(error.message))
      .finally(() => {
        setUnderWay((n) => n - 1);
        if (at + 1 === strips.length) lookAgain();
      });
    field.current?.focus();
  };
  const next = strips[at + 1];
  const canSeePeople = sitting.data?.roles.includes('lead') ?? false;
  if (!strip && underWay === 0) {
    return (
      <Empty head={w.none} action={<ButtonLink href={canSeePeople ? `/sittings/${sittingId}/people` : `/sittings/${sittingId}/scans`}>{canSeePeople ? w.toPeople : w.back}</ButtonLink>}>
        {w.noneText}
      </Empty>
    );
  }
  return (
    <View style={{ padding: isPhone ? 16 : 32, gap: 20, maxWidth: 640 }}>
      <View style={{ gap: 4 }}>
        <Text variant="title" level={1}>
          {w.title}
        </Text>
        <Text tone="ink2" isTabular live="polite" testID="numbers-left">
          {w.left(Math.max(0, left - at))}
        </Text>
      </View>
      {strip ? <Strip key={strip.scriptId} scriptId={strip.scriptId} version={strip.version} width={isPhone ? 340 : 560} /> : null}
      {/* The next one is fetched before it is needed. */}
      {next ? (
        <View aria-hidden style={{ height: 0, overflow: 'hidden' }}>
          <Strip scriptId={next.scriptId} version={next.version} />
        </View>
      ) : null}
      {strip ? (
        <View style={{ gap: 12 }}>
          <Vessel label={w.field} value={text} onChange={setText} variant="reading" maxLength={32} isFocusedFirst inputRef={field} onSubmit={() => (text.trim() === '' ? undefined : say(text.trim()))} testID="number-field" />
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
            <Button kind="primary" keyCap="Enter" onPress={() => say(text.trim())} closed={text.trim() === '' ? '' : undefined} testID="number-record">
              {w.record}
            </Button>
            <Button onPress={() => say(null)} testID="number-nothing">
              {w.nothing}
            </Button>
          </View>
        </View>
      ) : null}
      {read.failureCount > 0 && underWay > 0 ? (
        <Text tone="iodine" weight={600} live="polite">
          {w.waits(underWay)}
        </Text>
      ) : null}
      {refusal ? (
        <Text tone="methyl" live="assertive">
          {`${w.failed} ${refusal}`}
        </Text>
      ) : null}
    </View>
  );
}
