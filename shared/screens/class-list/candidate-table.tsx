import { useState } from 'react';
import { FlatList, View } from 'react-native';
import { useChangeAttendance } from '../../client/class-list';
import type { CandidateView } from '../../contracts/class-list';
import { attendances, type Attendance } from '../../contracts/enums';
import { Select } from '../../ui/select';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { size } from '../../ui/tokens';
import { useIsWide } from '../../ui/use-breakpoint';
import { AttendanceGlyph } from './attendance-glyph';
import { isToBeMarked } from './filter';
import { words } from './words';

interface CandidateTableProps {
  readonly sittingId: string;
  readonly rows: readonly CandidateView[];
  /** By candidate; null while names are not shown. */
  readonly names: ReadonlyMap<string, string> | null;
  readonly canChange: boolean;
}

const options = attendances.map((value) => ({ value, label: words.attendance[value] }));
const phoneRow = 72;

/** The class list, one row a candidate; attendance changes in its place. */
export function CandidateTable({ sittingId, rows, names, canChange }: CandidateTableProps) {
  const colors = useColors();
  const isWide = useIsWide();
  const change = useChangeAttendance(sittingId);
  const [refusal, setRefusal] = useState<string | null>(null);
  const height = isWide ? size.rowWide : phoneRow;
  const put = (candidate: CandidateView, attendance: Attendance) => {
    setRefusal(null);
    change.mutate({ candidate, attendance }, { onError: (error) => setRefusal(words.changeRefused(candidate.number, error.message)) });
  };
  return (
    <View role="table" aria-label={words.title} style={{ flex: 1, minHeight: 200 }}>
      {refusal === null ? null : (
        <Text tone="methyl" variant="small" live="assertive" style={{ paddingHorizontal: isWide ? 24 : 16, paddingBottom: 8 }}>
          {refusal}
        </Text>
      )}
      {isWide ? <Head hasNames={names !== null} /> : null}
      <FlatList
        style={{ flex: 1 }}
        data={rows}
        keyExtractor={({ id }) => id}
        getItemLayout={(_rows, index) => ({ length: height, offset: height * index, index })}
        initialNumToRender={30}
        windowSize={9}
        renderItem={({ item }) => (
          <View role="row" style={{ height, justifyContent: 'center', marginHorizontal: isWide ? 16 : 0, paddingHorizontal: isWide ? 8 : 16, borderBottomWidth: 1, borderColor: colors.hair }} testID={`candidate-${item.number}`}>
            {isWide ? (
              <WideRow candidate={item} names={names} canChange={canChange} onPut={put} />
            ) : (
              <PhoneRow candidate={item} names={names} canChange={canChange} onPut={put} />
            )}
          </View>
        )}
      />
    </View>
  );
}

const columns = { number: 150, name: 260, attendance: 190, script: 120 } as const;

function Head({ hasNames }: { hasNames: boolean }) {
  const colors = useColors();
  const cells = [
    [words.head.candidate, columns.number],
    ...(hasNames ? [[words.head.name, columns.name] as const] : []),
    [words.head.attendance, columns.attendance],
    [words.head.script, columns.script],
    [words.head.pages, null],
  ] as const;
  return (
    <View role="row" style={{ flexDirection: 'row', height: 36, alignItems: 'center', marginHorizontal: 16, paddingHorizontal: 8, borderBottomWidth: 1.5, borderTopWidth: 1, borderTopColor: colors.hair, borderBottomColor: colors.ink2 }}>
      {cells.map(([word, width]) => (
        <View key={word} role="columnheader" style={width === null ? { flex: 1 } : { width }}>
          <Text variant="label" tone="ink2">
            {word}
          </Text>
        </View>
      ))}
    </View>
  );
}

interface RowProps {
  readonly candidate: CandidateView;
  readonly names: ReadonlyMap<string, string> | null;
  readonly canChange: boolean;
  readonly onPut: (candidate: CandidateView, attendance: Attendance) => void;
}

function AttendanceCell({ candidate, canChange, onPut }: RowProps) {
  const glyph = <AttendanceGlyph attendance={candidate.attendance} />;
  if (canChange) {
    return (
      <Select
        label={words.attendanceOf(candidate.number)}
        isLabelHidden
        isBare
        height={34}
        glyph={glyph}
        value={candidate.attendance}
        options={options}
        onChange={(attendance) => onPut(candidate, attendance)}
        testID={`attendance-${candidate.number}`}
      />
    );
  }
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8, paddingLeft: 6 }}>
      {glyph}
      <Text variant="small">{words.attendance[candidate.attendance]}</Text>
    </View>
  );
}

const scriptText = ({ scriptNumber }: CandidateView): string => (scriptNumber === null ? '' : String(scriptNumber).padStart(5, '0'));

function PagesCell({ candidate }: { candidate: CandidateView }) {
  const { pagesIn, pagesDue } = candidate;
  if (!isToBeMarked(candidate) || candidate.scriptNumber === null) return null;
  const isMissing = pagesIn > 0 && pagesIn < pagesDue;
  return (
    <Text variant="small" weight={isMissing ? 600 : 400} tone={isMissing ? 'iodine' : 'ink'}>
      {pagesIn === 0 ? words.noPages : words.pages(pagesIn, pagesDue)}
    </Text>
  );
}

function WideRow(props: RowProps) {
  const { candidate, names } = props;
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center' }}>
      <View role="cell" style={{ width: columns.number }}>
        <Text variant="readingS" weight={400}>
          {candidate.number}
        </Text>
      </View>
      {names ? (
        <View role="cell" style={{ width: columns.name }}>
          <Text variant="small" lines={1}>
            {names.get(candidate.id) ?? ''}
          </Text>
        </View>
      ) : null}
      <View role="cell" style={{ width: columns.attendance, paddingRight: 24 }}>
        <AttendanceCell {...props} />
      </View>
      <View role="cell" style={{ width: columns.script }}>
        <Text variant="readingS" weight={400}>
          {scriptText(candidate)}
        </Text>
      </View>
      <View role="cell" style={{ flex: 1 }}>
        <PagesCell candidate={candidate} />
      </View>
    </View>
  );
}

function PhoneRow(props: RowProps) {
  const { candidate, names } = props;
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12 }}>
      <View role="cell" style={{ flex: 1, minWidth: 0 }}>
        <Text variant="reading">{candidate.number}</Text>
        <Text variant="small" tone="ink2" lines={1}>
          {names?.get(candidate.id) ?? (candidate.scriptNumber === null ? '' : `${words.head.script} ${scriptText(candidate)}`)}
        </Text>
      </View>
      <View role="cell" style={{ alignItems: 'flex-end' }}>
        <PagesCell candidate={candidate} />
      </View>
      <View role="cell" style={{ width: 150 }}>
        <AttendanceCell {...props} />
      </View>
    </View>
  );
}
