import { useState } from 'react';
import { ScrollView, View } from 'react-native';
import { ApiError } from '../../client/api';
import { useConfirmClassList, usePreviewClassList } from '../../client/class-list';
import type { ListPreview } from '../../contracts/class-list';
import type { SittingView } from '../../contracts/sittings';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useIsWide } from '../../ui/use-breakpoint';
import { Vessel } from '../../ui/vessel';
import { pickFile } from '../pick-file';
import { ImportPreview } from './import-preview';
import { textOf } from './read-text';
import { words } from './words';

interface ImportPaneProps {
  readonly sitting: SittingView;
  readonly onBack: () => void;
  readonly onDone: (sentence: string) => void;
}

interface Checked {
  readonly text: string;
  readonly preview: ListPreview;
}

/** A class list from a file or by pasting: checked first, then imported whole. */
export function ImportPane({ sitting, onBack, onDone }: ImportPaneProps) {
  const isWide = useIsWide();
  const [text, setText] = useState('');
  const [fileLine, setFileLine] = useState<string | undefined>();
  const [fileError, setFileError] = useState<string | undefined>();
  const [checked, setChecked] = useState<Checked | null>(null);
  const preview = usePreviewClassList(sitting.id);
  const confirm = useConfirmClassList(sitting.id);
  const isCurrent = checked !== null && checked.text === text;

  const check = (wanted: string) => preview.mutate(wanted, { onSuccess: (found) => setChecked({ text: wanted, preview: found }) });

  const choose = async () => {
    const file = await pickFile('.csv,.txt,text/csv,text/plain');
    if (!file) return;
    const read = await textOf(file);
    setFileError(read.ok ? undefined : read.message);
    setFileLine(read.ok ? words.import.fileRead(file.name) : undefined);
    if (!read.ok) return;
    setText(read.text);
    check(read.text);
  };

  const importNow = ({ text: wanted, preview: { hash } }: Checked) => {
    if (hash === null) return;
    confirm.mutate(
      { text: wanted, hash },
      {
        onSuccess: ({ added, changed }) => onDone(words.import.done(added, changed)),
        onError: (error) => {
          if (error instanceof ApiError && error.code === 'conflict') setChecked({ text: wanted, preview: error.current as ListPreview });
        },
      },
    );
  };

  const failure = preview.error ?? (confirm.error instanceof ApiError && confirm.error.code === 'conflict' ? null : confirm.error);
  return (
    <ScrollView contentContainerStyle={{ padding: isWide ? 24 : 16, gap: 20, maxWidth: 980 }}>
      <View style={{ alignSelf: 'flex-start' }}>
        <Button kind="text" icon="back" onPress={onBack}>
          {words.import.back}
        </Button>
      </View>
      <Text variant="display" level={1}>
        {words.import.title}
      </Text>
      <View style={{ alignSelf: 'flex-start' }}>
        <Button icon="page" onPress={() => void choose()} testID="choose-list">
          {words.import.chooseFile}
        </Button>
      </View>
      {fileError ?? fileLine ? (
        <Text variant="small" tone={fileError ? 'methyl' : 'ink2'} live="polite">
          {fileError ?? fileLine}
        </Text>
      ) : null}
      <Vessel
        label={words.import.text}
        help={words.import.textHelp}
        value={text}
        onChange={setText}
        lines={8}
        height={200}
        variant="readingS"
        maxLength={1_000_000}
        testID="list-text"
      />
      {isCurrent ? null : (
        <View style={{ alignSelf: 'flex-start' }}>
          <Button kind="primary" isBusy={preview.isPending} closed={text.trim() === '' ? words.import.needsText : undefined} onPress={() => check(text)} testID="check-list">
            {preview.isPending ? words.import.checking : words.import.preview}
          </Button>
        </View>
      )}
      {failure ? (
        <Text tone="methyl" live="assertive">
          {failure.message}
        </Text>
      ) : null}
      {isCurrent && confirm.error instanceof ApiError && confirm.error.code === 'conflict' ? (
        <Text tone="iodine" live="assertive">
          {words.import.changedMeanwhile}
        </Text>
      ) : null}
      {isCurrent ? <ImportPreview preview={checked.preview} isLocked={sitting.lockedAt !== null} isBusy={confirm.isPending} onConfirm={() => importNow(checked)} /> : null}
    </ScrollView>
  );
}
