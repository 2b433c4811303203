import type { ReactNode } from 'react';
import { View } from 'react-native';
import { useWaiting } from '../../client/sittings';
import type { WaitingLine } from '../../contracts/waiting';
import { ButtonLink } from '../../ui/button';
import { Icon } from '../../ui/icon';
import { PairGlyph } from '../../ui/pair-glyph';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { QueryState } from '../query-state';
import { words } from './words';

const glyphs: Readonly<Record<WaitingLine['kind'], ReactNode>> = {
  rule: <PairGlyph state="discordant" scale={1.3} />,
  read: <PairGlyph state="single" scale={1.3} />,
  blanks: <PairGlyph state="blank" scale={1.3} />,
  sort: <Icon name="page" size={26} tone="iodine" />,
  differ: <Icon name="page" size={26} tone="iodine" />,
  numbers: <Icon name="note" size={26} tone="ink2" />,
  'by-hand': <Icon name="note" size={26} tone="ink2" />,
  lock: <Icon name="note" size={26} tone="ink2" />,
};

const hrefs: Readonly<Record<WaitingLine['kind'], (line: WaitingLine) => string>> = {
  rule: ({ sittingId }) => `/sittings/${sittingId}/moderation?show=to-rule`,
  read: ({ sittingId, item }) => `/desk/${sittingId}${item ? `?item=${item.id}` : ''}`,
  blanks: ({ sittingId }) => `/sittings/${sittingId}/blanks`,
  sort: ({ sittingId }) => `/sittings/${sittingId}/sorting`,
  differ: ({ sittingId }) => `/sittings/${sittingId}/people`,
  numbers: ({ sittingId }) => `/sittings/${sittingId}/numbers`,
  'by-hand': ({ sittingId }) => `/sittings/${sittingId}/by-hand`,
  lock: ({ sittingId }) => `/sittings/${sittingId}/paper`,
};

/** What waits, as lines: the first with the primary button. */
export function WaitingLines() {
  const waiting = useWaiting();
  return (
    <View style={{ gap: 8 }}>
      <Text variant="head" level={2}>
        {words.waiting}
      </Text>
      <QueryState query={waiting} fetching="Fetching what waits" failed="What waits did not come." rows={2}>
        {({ lines }) =>
          lines.length === 0 ? (
            <Text tone="ink2">{words.nothingWaits}</Text>
          ) : (
            <View role="list" aria-label={words.waiting}>
              {lines.map((line, index) => (
                <Line key={`${line.kind}-${line.sittingId}`} line={line} isFirst={index === 0} />
              ))}
            </View>
          )
        }
      </QueryState>
    </View>
  );
}

function Line({ line, isFirst }: { line: WaitingLine; isFirst: boolean }) {
  const colors = useColors();
  const { what, go } = words.lines[line.kind];
  const lead = line.kind === 'read' && line.item ? `${words.item(line.item)}: ` : '';
  return (
    <View role="listitem" style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 18, rowGap: 10, paddingVertical: 12, borderTopWidth: 1, borderColor: colors.hair }}>
      <View style={{ width: 36, alignItems: 'center' }}>{glyphs[line.kind]}</View>
      <View style={{ flex: 1, minWidth: 200, gap: 2 }}>
        <Text variant="head" weight={400}>
          {lead}
          {line.kind === 'lock' ? null : (
            <Text variant="head" weight={600} isTabular>
              {`${line.count.toLocaleString('en-GB')} `}
            </Text>
          )}
          {what(line.count)}
        </Text>
        <Text variant="small" tone="ink2">
          {line.sitting}
        </Text>
      </View>
      <ButtonLink href={hrefs[line.kind](line)} {...(isFirst ? { kind: 'primary' as const } : {})} testID={`waiting-${line.kind}`}>
        {go}
      </ButtonLink>
    </View>
  );
}
