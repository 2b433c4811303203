import { useState, type ReactNode } from 'react';
import { View } from 'react-native';
import type { Derivation as DerivationData } from '../../chemistry/derivation';
import { useCheckKey, useVet } from '../../client/vetting';
import type { VettingItem } from '../../contracts/vetting';
import { marksText } from '../../marking/grains';
import { understood } from '../../marking/understood';
import { Button } from '../../ui/button';
import { SameGlyph } from '../../ui/pair-glyph';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsWide } from '../../ui/use-breakpoint';
import { Vessel } from '../../ui/vessel';
import { ChemText } from '../chem-text';
import { momentText } from '../times';
import { WorkedDerivation } from '../worked-derivation';
import { words } from './words';

interface VettingItemProps {
  readonly sittingId: string;
  readonly item: VettingItem;
  readonly next: VettingItem | null;
  readonly onNext: (itemId: string) => void;
}

/** One item to vet: worked by oneself, then uncovered, then signed or sent back. */
export function VettingItemPane({ sittingId, item, next, onNext }: VettingItemProps) {
  const colors = useColors();
  const isWide = useIsWide();
  const [isAgain, setAgain] = useState(false);
  const isWorking = item.cannotVet === null && (item.mine === null || isAgain);
  return (
    <View style={{ flex: 1, flexDirection: isWide ? 'row' : 'column' }}>
      <View style={{ flex: isWide ? 1 : undefined, minWidth: 0, padding: isWide ? 28 : 16, gap: 20, backgroundColor: colors.paper }}>
        <Text variant="head" level={2}>
          {words.one}
        </Text>
        <View style={{ padding: 16, backgroundColor: colors.glass, borderWidth: 1, borderColor: colors.hair, borderRadius: 2 }}>
          <Text>
            <Text weight={600}>{`${item.number}  `}</Text>
            <ChemText>{item.prompt}</ChemText>
            {` [${marksText(item.maxGrains)}]`}
          </Text>
        </View>
        {item.cannotVet === null ? null : <Text tone="ink2">{item.cannotVet}</Text>}
        {isWorking ? (
          <OwnValue sittingId={sittingId} item={item} onDone={() => setAgain(false)} />
        ) : item.mine === null ? null : (
          <View style={{ gap: 4 }}>
            <Text variant="label">{words.yourValue}</Text>
            <Text variant="readingL">{item.mine.text}</Text>
            <Text variant="small" tone="ink2">{`${words.withCover} ${momentText(item.mine.at)}`}</Text>
          </View>
        )}
        {item.key !== null && !isWorking ? <Uncovered item={item} /> : null}
      </View>
      <View style={{ flex: isWide ? 1 : undefined, minWidth: 0, padding: isWide ? 28 : 16, gap: 20, backgroundColor: colors.bench, borderLeftWidth: isWide ? 1 : 0, borderColor: colors.hair }}>
        {item.key !== null && !isWorking ? (
          <>
            <Decides item={item} />
            {item.cannotVet === null ? <Sign sittingId={sittingId} item={item} next={next} onNext={onNext} onAgain={() => setAgain(true)} /> : null}
            <Past item={item} />
          </>
        ) : (
          <Text tone="ink2">{words.opens}</Text>
        )}
      </View>
    </View>
  );
}

function OwnValue({ sittingId, item, onDone }: { sittingId: string; item: VettingItem; onDone: () => void }) {
  const check = useCheckKey(sittingId);
  const [text, setText] = useState('');
  const back = understood(text, item);
  const go = () => {
    if (back.kind === 'value') check.mutate({ itemId: item.itemId, rev: item.rev, text }, { onSuccess: onDone });
  };
  return (
    <View style={{ gap: 12 }}>
      <Vessel label={words.yourValue} value={text} onChange={setText} variant="readingL" height={64} maxLength={64} error={back.kind === 'refused' ? back.message : undefined} help={back.kind === 'value' ? back.form : ''} isFocusedFirst onSubmit={go} testID="own-value" />
      <Button kind="primary" onPress={go} isBusy={check.isPending} closed={back.kind === 'value' ? undefined : ''} testID="uncover">
        {words.uncover}
      </Button>
      {check.error ? (
        <Text tone="methyl" live="assertive">
          {check.error.message}
        </Text>
      ) : null}
    </View>
  );
}

function Uncovered({ item }: { item: VettingItem }) {
  const derivation = item.derivation as DerivationData | null;
  const other = item.otherDerivation as DerivationData | null;
  const isDifference = derivation !== null && other !== null;
  return (
    <View style={{ gap: 12 }}>
      <Text variant="head" level={2}>
        {words.two}
      </Text>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12 }}>
        {item.mine?.agrees ? <SameGlyph /> : null}
        <Text variant="readingM" tone="copper">
          {item.key}
        </Text>
        <Text>
          {words.key}
          {item.mine ? (
            <Text weight={600} tone={item.mine.agrees ? 'manganate' : 'iodine'}>
              {`, ${item.mine.agrees ? words.asYou : words.notAsYou}`}
            </Text>
          ) : null}
        </Text>
      </View>
      {isDifference ? <Text weight={600}>{words.first}</Text> : null}
      {derivation ? <WorkedDerivation derivation={isDifference ? { ...derivation, steps: derivation.steps.slice(0, -1) } : derivation} quantity={isDifference ? 'zeff' : item.quantity} /> : null}
      {isDifference ? (
        <>
          <Text weight={600}>{words.second}</Text>
          <WorkedDerivation derivation={other} quantity="zeff" />
          <Text variant="readingM" tone="copper" weight={600} align="right">
            {derivation.steps.at(-1)}
          </Text>
        </>
      ) : null}
    </View>
  );
}

const line = (left: string, right: ReactNode, colors: { hair: string }) => (
  <View key={left} style={{ flexDirection: 'row', gap: 14, paddingVertical: 10, borderBottomWidth: 1, borderColor: colors.hair }}>
    <Text variant="small" tone="ink2" style={{ width: 110 }}>
      {left}
    </Text>
    <Text variant="small" style={{ flex: 1 }}>
      {typeof right === 'string' ? <ChemText beside="small">{right}</ChemText> : right}
    </Text>
  </View>
);

function Decides({ item }: { item: VettingItem }) {
  const colors = useColors();
  return (
    <View>
      <Text variant="head" level={2}>
        {words.three}
      </Text>
      {item.decides.map(({ name, words: said }) => line(name, said, colors))}
    </View>
  );
}

function Sign({ sittingId, item, next, onNext, onAgain }: VettingItemProps & { onAgain: () => void }) {
  const vet = useVet(sittingId);
  const [comment, setComment] = useState('');
  const [needsComment, setNeedsComment] = useState(false);
  const give = (outcome: 'signed' | 'sent-back') => {
    const said = comment.trim();
    setNeedsComment(outcome === 'sent-back' && said === '');
    if (outcome === 'sent-back' && said === '') return;
    vet.mutate({ itemId: item.itemId, rev: item.rev, body: { outcome, comment: said === '' ? null : said } }, { onSuccess: () => (outcome === 'signed' && next ? onNext(next.itemId) : undefined) });
  };
  return (
    <View style={{ gap: 12 }}>
      <Vessel label={words.comment} value={comment} onChange={setComment} help={words.commentHelp} error={needsComment ? words.needsComment : undefined} lines={3} height={84} maxLength={500} testID="vetting-comment" />
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
        <Button kind="primary" onPress={() => give('signed')} isBusy={vet.isPending} testID="sign-item">
          {words.sign(item.number, next?.number ?? null)}
        </Button>
        <Button onPress={() => give('sent-back')} isBusy={vet.isPending} testID="send-back">
          {words.sendBack}
        </Button>
        <Button kind="text" onPress={onAgain}>
          {words.again}
        </Button>
      </View>
      {vet.error ? (
        <Text tone="methyl" live="assertive">
          {vet.error.message}
        </Text>
      ) : null}
    </View>
  );
}

function Past({ item }: { item: VettingItem }) {
  return (
    <View style={{ gap: 8 }}>
      {item.vettings.map(({ by, outcome, comment, at }) => (
        <View key={`${at}-${outcome}`}>
          <Text variant="small" weight={600} tone={outcome === 'signed' ? 'ink' : 'iodine'}>
            {words.by(by, outcome === 'signed' ? words.signed : words.sentBack, momentText(at))}
          </Text>
          {comment === null ? null : <Text variant="small">{comment}</Text>}
        </View>
      ))}
    </View>
  );
}
