import { createStore, del, get, set } from 'idb-keyval';
import { useEffect, useRef, useState } from 'react';
import { View } from 'react-native';
import { v7 as uuidv7 } from 'uuid';
import { useHandSheet, useTypeByHand } from '../../client/people-and-paper';
import type { HandSheet } from '../../contracts/people-and-paper';
import type { Code } from '../../marking/scheme';
import { understood } from '../../marking/understood';
import { Button } from '../../ui/button';
import { Checkbox } from '../../ui/checkbox';
import { Text } from '../../ui/text';
import { useToast } from '../../ui/toast';
import { useColors } from '../../ui/theme';
import { Vessel } from '../../ui/vessel';
import { ChemText } from '../chem-text';
import { codeWords } from '../desk/words';
import { QueryState } from '../query-state';
import { isWhole, type TypedItem } from './typed-item';
import { words } from './words';

const w = words.hand;
const offered: readonly Code[] = ['blank', 'cannot-read', 'crossed-out', 'two-answers', 'ask-the-lead'];
const store = typeof indexedDB === 'undefined' ? undefined : createStore('meniscus-by-hand', 'typed');

type Typed = Readonly<Record<string, TypedItem>>;
const nothing: TypedItem = { text: '', code: null, method: [] };

/** One script item by item; kept on this device until all of it is recorded. */
export function HandForm({ sittingId, scriptId, onClose }: { sittingId: string; scriptId: string; onClose: () => void }) {
  const sheet = useHandSheet(scriptId);
  const [kept, setKept] = useState<Typed | null>(null);
  useEffect(() => {
    void (store ? get<Typed>(scriptId, store) : Promise.resolve(undefined)).then((found) => setKept(found ?? {}), () => setKept({}));
  }, [scriptId]);
  return (
    <QueryState query={sheet} fetching="Fetching the items" failed="The items did not come.">
      {(found) => (kept ? <Form sittingId={sittingId} sheet={found} kept={kept} onClose={onClose} /> : null)}
    </QueryState>
  );
}

function Form({ sittingId, sheet, kept, onClose }: { sittingId: string; sheet: HandSheet; kept: Typed; onClose: () => void }) {
  const toast = useToast();
  const send = useTypeByHand(sittingId, sheet.scriptId);
  const [typed, setTyped] = useState<Typed>(kept);
  const [isTried, setTried] = useState(false);
  const began = useRef({ at: Date.now(), ids: new Map(sheet.items.map(({ itemId }) => [itemId, uuidv7()])) });
  const of = (itemId: string): TypedItem => typed[itemId] ?? nothing;
  const put = (itemId: string, next: TypedItem) => {
    const all = { ...typed, [itemId]: next };
    setTyped(all);
    if (store) void set(sheet.scriptId, all, store).catch(() => undefined);
  };
  const missing = sheet.items.filter((item) => !isWhole(of(item.itemId), item));
  const go = () => {
    setTried(true);
    if (missing.length > 0 || send.isPending) return;
    const readings = sheet.items.map(({ itemId }) => {
      const { text, code, method } = of(itemId);
      return { id: began.current.ids.get(itemId) ?? uuidv7(), itemId, method: [...method], ...(code === null ? { text: text.trim() } : { code }) };
    });
    send.mutate(
      { readings, openedAt: began.current.at },
      {
        onSuccess: () => {
          if (store) void del(sheet.scriptId, store).catch(() => undefined);
          toast({ text: w.sent(sheet.candidateNumber), icon: 'check' });
          onClose();
        },
      },
    );
  };
  return (
    <View style={{ gap: 20 }}>
      <View style={{ gap: 4 }}>
        <Text variant="head" level={2}>
          {w.sheet(sheet.candidateNumber)}
        </Text>
        <Text variant="small" tone="ink2">
          {w.leave}
        </Text>
      </View>
      {sheet.items.map((item, index) => (
        <ItemField key={item.itemId} item={item} typed={of(item.itemId)} isFirst={index === 0} isMissing={isTried && missing.includes(item)} onTyped={(next) => put(item.itemId, next)} />
      ))}
      {isTried && missing.length > 0 ? (
        <Text tone="methyl" live="assertive">
          {w.missing(missing.map(({ number }) => number))}
        </Text>
      ) : null}
      {send.error ? (
        <Text tone="methyl" live="assertive">
          {send.error.message}
        </Text>
      ) : null}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
        <Button kind="primary" isBusy={send.isPending} onPress={go} testID="hand-send">
          {w.send}
        </Button>
        <Button onPress={onClose}>{w.back}</Button>
      </View>
    </View>
  );
}

interface ItemFieldProps {
  readonly item: HandSheet['items'][number];
  readonly typed: TypedItem;
  readonly isFirst: boolean;
  readonly isMissing: boolean;
  readonly onTyped: (typed: TypedItem) => void;
}

function ItemField({ item, typed, isFirst, isMissing, onTyped }: ItemFieldProps) {
  const colors = useColors();
  const back = understood(typed.text, item);
  const error = typed.code !== null ? undefined : back.kind === 'refused' ? back.message : isMissing ? w.missing([item.number]) : undefined;
  const help = typed.code !== null ? codeWords[typed.code] : back.kind === 'value' ? `${back.value}. ${back.form}` : undefined;
  return (
    <View role="group" aria-label={w.item(item.number, item.label)} style={{ gap: 8, paddingTop: 14, borderTopWidth: 1, borderColor: colors.hair }}>
      <Text weight={600}>{w.item(item.number, item.label)}</Text>
      <Text variant="small" tone="ink2">
        <ChemText>{item.prompt}</ChemText>
      </Text>
      <Vessel label={w.item(item.number, item.label)} isLabelHidden value={typed.text} onChange={(text) => onTyped({ ...typed, text, code: null })} variant="reading" maxLength={64} isFocusedFirst={isFirst} help={help} error={error} testID={`hand-${item.number}`} />
      <View role="group" aria-label={w.codes} style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 8 }}>
        {offered.map((code) => (
          <Button key={code} kind="text" isSmall isPressedIn={typed.code === code} label={`${codeWords[code]}, item ${item.number}`} onPress={() => onTyped({ ...typed, text: '', code: typed.code === code ? null : code })}>
            {codeWords[code]}
          </Button>
        ))}
      </View>
      {item.methodMarks.map(({ id, text }) => (
        <Checkbox key={id} isChecked={typed.method.includes(id)} onChange={(isStruck) => onTyped({ ...typed, method: isStruck ? [...typed.method, id] : typed.method.filter((one) => one !== id) })}>
          {text}
        </Checkbox>
      ))}
    </View>
  );
}
