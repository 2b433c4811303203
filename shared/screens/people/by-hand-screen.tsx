import { useState } from 'react';
import { View } from 'react-native';
import { useHandScripts } from '../../client/people-and-paper';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useIsPhone } from '../../ui/use-breakpoint';
import { InSitting } from '../in-sitting';
import { QueryState } from '../query-state';
import { HandForm } from './hand-form';
import { Row } from './section';
import { words } from './words';

const w = words.hand;

/** Scripts without a usable scan, typed from the paper. */
export function ByHandScreen({ sittingId }: { sittingId: string }) {
  const scripts = useHandScripts(sittingId);
  const isPhone = useIsPhone();
  const [open, setOpen] = useState<string | null>(null);
  return (
    <InSitting sittingId={sittingId}>
      <View style={{ padding: isPhone ? 16 : 32, gap: 20, maxWidth: 760 }}>
        <View style={{ gap: 6 }}>
          <Text variant="title" level={1}>
            {w.title}
          </Text>
          <Text tone="ink2">{w.lead}</Text>
        </View>
        {open ? (
          <HandForm key={open} sittingId={sittingId} scriptId={open} onClose={() => setOpen(null)} />
        ) : (
          <QueryState query={scripts} fetching="Fetching scripts" failed="The scripts did not come." rows={2}>
            {({ scripts: list }) =>
              list.length === 0 ? (
                <Text>{w.none}</Text>
              ) : (
                <View role="list" aria-label={w.title}>
                  {list.map(({ scriptId, candidateNumber }) => (
                    <Row key={scriptId} acts={<Button onPress={() => setOpen(scriptId)} testID={`type-${candidateNumber}`}>{w.open(candidateNumber)}</Button>}>
                      <Text variant="reading">{candidateNumber}</Text>
                    </Row>
                  ))}
                </View>
              )
            }
          </QueryState>
        )}
      </View>
    </InSitting>
  );
}
