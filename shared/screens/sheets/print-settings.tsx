import { useRef, useState } from 'react';
import { View } from 'react-native';
import { v7 as uuidv7 } from 'uuid';
import { useMakePrinting } from '../../client/printings';
import { paperSizeNames } from '../../contracts/enums';
import type { PrintingView, SheetPreview } from '../../contracts/printings';
import type { PaperSize } from '../../sheets/geometry';
import { Button, ButtonLink } from '../../ui/button';
import { ChoiceRows } from '../../ui/choice-row';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { Vessel } from '../../ui/vessel';
import { amountOf, sparesOf, type Amount, type Wish } from './amount';
import { LockForPrinting } from './lock-for-printing';
import { words } from './words';

interface PrintSettingsProps {
  readonly sittingId: string;
  readonly preview: SheetPreview;
  readonly printings: readonly PrintingView[];
  readonly paperSize: PaperSize;
  readonly onPaperSize: (size: PaperSize) => void;
}

const isListEmpty = ({ candidates, withPagesIn, away }: SheetPreview): boolean => candidates + withPagesIn + away === 0;

/** What still keeps sheets from being made; null when nothing does, empty where the screen says it elsewhere. */
function whyNot({ preview, printings }: PrintSettingsProps, { candidates, spares }: Amount, wish: Wish): string | null {
  if (preview.problem !== null) return preview.problem;
  if (!preview.isLocked) return words.open.needed;
  if (sparesOf(wish.spares) === null) return '';
  if (printings.some(({ state }) => state === 'making')) return words.wait;
  if (candidates + spares > 0) return null;
  return isListEmpty(preview) ? '' : words.nothing;
}

/** Paper, for whom, spares, what that comes to, and the button that makes it. */
export function PrintSettings(props: PrintSettingsProps) {
  const { sittingId, preview, printings, paperSize, onPaperSize } = props;
  const [wish, setWish] = useState<Wish>({ for: 'all', spares: '' });
  const make = useMakePrinting(sittingId);
  const once = useRef(uuidv7());
  const amount = amountOf(preview, wish);
  const spares = sparesOf(wish.spares);
  const why = whyNot(props, amount, wish);
  const send = () =>
    make.mutate(
      { body: { paperSize, spares: spares ?? 0, for: wish.for }, once: once.current },
      {
        onSuccess: () => {
          once.current = uuidv7();
          setWish({ for: 'all', spares: '' });
        },
      },
    );
  return (
    <View style={{ gap: 24 }}>
      {preview.isLocked ? null : <LockForPrinting sittingId={sittingId} />}
      <ChoiceRows label={words.paperSize} choices={paperSizeNames.map((value) => ({ value, label: words.papers[value], note: words.paperNotes[value] }))} chosen={paperSize} onChoose={onPaperSize} />
      {printings.length > 0 && preview.withoutSheet > 0 && preview.withoutSheet < preview.candidates ? (
        <ChoiceRows
          label={words.whom.label}
          choices={[
            { value: 'all', label: words.whom.all(preview.candidates) },
            { value: 'without-sheet', label: words.whom.withoutSheet(preview.withoutSheet) },
          ]}
          chosen={wish.for}
          onChoose={(whom) => setWish({ ...wish, for: whom })}
        />
      ) : null}
      <Vessel
        label={words.spares.label}
        value={wish.spares}
        onChange={(text) => setWish({ ...wish, spares: text })}
        help={words.spares.help}
        error={spares === null ? words.spares.refused : undefined}
        keyboard="numeric"
        variant="readingS"
        maxLength={4}
        testID="spares"
      />
      <AmountLines sittingId={sittingId} preview={preview} amount={amount} />
      {printings.length > 0 ? (
        <Text variant="small" tone="iodine">
          {words.again(Math.max(...printings.map(({ layout }) => layout)) + 1)}
        </Text>
      ) : null}
      <Button kind="primary" icon="print" isWide isBusy={make.isPending} closed={why ?? undefined} onPress={send} testID="make-sheets">
        {words.make}
      </Button>
      {make.error ? (
        <Text tone="methyl" live="assertive">
          {make.error.message}
        </Text>
      ) : null}
    </View>
  );
}

/** What a printing comes to, said before anything is made. */
function AmountLines({ sittingId, preview, amount }: { sittingId: string; preview: SheetPreview; amount: Amount }) {
  const colors = useColors();
  const { candidates, spares, pages, pagesEach, sheets } = amount;
  const w = words.amount;
  if (preview.problem !== null) return null;
  return (
    <View style={{ gap: 6 }}>
      <Text variant="head" level={2}>
        {w.head}
      </Text>
      <Text weight={600} isTabular live="polite" testID="sheets-amount" style={{ paddingTop: 6, borderTopWidth: 1, borderColor: colors.hair }}>
        {[candidates > 0 || spares === 0 ? [w.candidates(candidates)] : [], spares > 0 ? [w.spares(spares)] : [], [w.pages(pages)]].flat().join(', ')}
      </Text>
      <Text variant="small" tone="ink2">{`${w.each(pagesEach, preview.items)}. ${w.paper(sheets, preview.paperSize)}.`}</Text>
      {preview.withPagesIn > 0 ? (
        <Text variant="small" tone="ink2">
          {w.pagesIn(preview.withPagesIn)}
        </Text>
      ) : null}
      {preview.away > 0 ? (
        <Text variant="small" tone="ink2">
          {w.away(preview.away)}
        </Text>
      ) : null}
      {isListEmpty(preview) ? (
        <View style={{ gap: 8, alignItems: 'flex-start' }}>
          <Text variant="small" tone="iodine">
            {words.nobody}
          </Text>
          <ButtonLink isSmall href={`/sittings/${sittingId}/class-list`}>
            {words.toClassList}
          </ButtonLink>
        </View>
      ) : null}
    </View>
  );
}
