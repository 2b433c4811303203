import { useRouter } from 'expo-router';
import { useLayoutEffect, useRef, useState } from 'react';
import { View, type TextInput } from 'react-native';
import type { DeskItem } from '../../contracts/desk';
import type { Code } from '../../marking/scheme';
import { understood } from '../../marking/understood';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsWide } from '../../ui/use-breakpoint';
import { useKeys } from '../../ui/use-keys';
import { struckWords } from '../method-words';
import { CheckPosition } from '../check-position';
import { PageOnMat } from '../page-on-mat';
import { useMethodMarks } from '../use-method-marks';
import { CodeSheet, rareCodes } from './code-choice';
import { DeskFoot } from './desk-foot';
import { DeskHead } from './desk-head';
import { DeskStrips } from './desk-strips';
import { DeskTools } from './desk-tools';
import { isOver, ItemEnd, nextItem } from './item-end';
import { JustRead } from './just-read';
import { KeysDialog, NoteDialog } from './desk-dialogs';
import { keepFocusIn } from './keep-focus';
import { ScanMat } from './scan-mat';
import { saidText, useDeskWork } from './use-desk-work';
import { words } from './words';
import type { Said } from './work-list';

export interface DeskItemProps {
  readonly sittingId: string;
  readonly course: string;
  readonly title: string;
  readonly personId: string;
  readonly item: DeskItem;
  readonly items: readonly DeskItem[];
  readonly emptyBoxes: number;
  /** When the counts of the items were fetched. */
  readonly countedAt: number;
}

type Open = 'other' | 'note' | 'keys' | null;
const closest = 3;
const view = { turns: 0, zoom: 1, isWhole: false };

/** One item at the desk: its answers one after the other, in random order. */
export function DeskItemWork({ sittingId, course, title, personId, item, items, emptyBoxes, countedAt }: DeskItemProps) {
  const colors = useColors();
  const router = useRouter();
  const isWide = useIsWide();
  const work = useDeskWork({ sittingId, itemId: item.id, personId });
  const [text, setText] = useState('');
  const [note, setNote] = useState('');
  const [picture, setPicture] = useState(view);
  const [open, setOpen] = useState<Open>(null);
  const [code, setCode] = useState<Code | null>(null);
  const method = useMethodMarks(item.methodMarks);
  const field = useRef<TextInput>(null);
  const isRecording = useRef(false);
  const { shown } = work;
  const lease = shown.kind === 'none' ? null : shown.kind === 'done' ? shown.done.lease : shown.lease;
  const canType = shown.kind === 'next' || shown.kind === 'later';

  const answerId = lease?.answerId;
  // Before it is painted: the next answer never stands for a moment as the last one was turned.
  useLayoutEffect(() => {
    setPicture(view);
    setCode(null);
    setOpen(null);
    field.current?.focus();
  }, [answerId]);

  const clear = () => {
    setText('');
    method.reset([]);
  };
  const say = (said: Said) => {
    if (!canType || isRecording.current) return;
    isRecording.current = true;
    const { struck } = method;
    // The field is free at once: what is typed from here on belongs to the next answer.
    clear();
    setNote('');
    void work.record({ ...said, ...(note === '' ? {} : { note }), ...(item.methodMarks.length === 0 ? {} : { method: struck }) }).then((isKept) => {
      isRecording.current = false;
      field.current?.focus();
      if (isKept) return;
      setText(said.text ?? '');
      setNote(note);
      method.reset(struck);
    });
  };
  const look = (step: 1 | -1) => {
    clear();
    work.look(step);
  };
  const takeBack = () => void work.takeBackLast().then((isBack) => isBack && clear());
  const type = (typed: string) => {
    setText(typed);
    method.end();
  };
  const sayCode = (chosen: Code) => {
    setOpen(null);
    if (text === '') say({ code: chosen });
  };
  const record = () => {
    if (open === 'other') {
      if (code !== null) sayCode(code);
    } else if (understood(text, item).kind === 'value') say({ text });
  };
  const zoom = (factor: number) => setPicture((before) => ({ ...before, zoom: Math.min(closest, Math.max(1, before.zoom * factor)) }));
  const whole = () => setPicture((before) => ({ ...before, isWhole: !before.isWhole }));
  const turn = () => setPicture((before) => ({ ...before, turns: (before.turns + 1) % 4 }));
  const close = () => {
    setOpen(null);
    setCode(null);
    field.current?.focus();
  };

  useKeys(
    {
      Enter: ({ repeat }) => {
        const next = isOver(work) ? nextItem(items, item.id) : undefined;
        if (next && !repeat) router.push(`/desk/${sittingId}?item=${next.id}`);
        else record();
      },
      B: () => sayCode('blank'),
      X: () => sayCode('cannot-read'),
      S: () => sayCode('ask-the-lead'),
      W: () => (open === 'other' ? close() : setOpen('other')),
      ...(item.methodMarks.length > 0 && canType ? { M: method.begin, ArrowDown: method.begin } : {}),
      ...(open === 'other' && !method.isNumbering ? Object.fromEntries(rareCodes.map((rare, index) => [String(index + 1), () => setCode(rare)])) : {}),
      U: takeBack,
      N: () => setOpen('note'),
      T: turn,
      Z: () => zoom(1.5),
      'Shift+Z': () => zoom(1 / 1.5),
      P: whole,
      PageUp: () => look(1),
      PageDown: () => look(-1),
      '?': () => setOpen('keys'),
      Escape: () => {
        if (method.isNumbering) method.end();
        else if (open !== null) close();
        else if (picture.isWhole) whole();
        else if (text !== '') setText('');
        else if (method.struck.length > 0) method.reset([]);
        else router.push('/');
      },
    },
    { isOff: open === 'note' || open === 'keys' },
  );

  const refused = new Set(work.justDone.refused.map(({ id }) => id));
  const unsent = new Set(work.justDone.waiting.map(({ id }) => id));
  const readHere = work.done.filter(({ at, readingId }) => !refused.has(readingId) && (at > countedAt || unsent.has(readingId))).length;
  const last = work.done.filter(({ readingId }) => !refused.has(readingId)).at(-1);
  return (
    <View {...(keepFocusIn(field) as object)} style={{ flex: 1, minHeight: 0 }}>
      <DeskHead sittingId={sittingId} course={course} title={title} item={item} items={items} emptyBoxes={emptyBoxes} readHere={readHere} />
      <DeskStrips queue={work.justDone} problem={work.problem} onSignIn={work.signIn} onForget={work.forgetRefused} onSendAgain={work.sendRefused} />
      <Text variant="micro" live="polite" style={{ position: 'absolute', width: 1, height: 1, overflow: 'hidden', opacity: 0 }} testID="desk-said">
        {work.message}
      </Text>
      <View style={{ flex: 1, minHeight: 0, flexDirection: 'row' }}>
        <View style={{ flex: 1, minWidth: 0, minHeight: 0 }}>
          {lease ? (
            <>
              {picture.isWhole ? <PageOnMat id={lease.pageImageId} rev={lease.pageImageRev} label={words.pagePicture(lease.candidateNumber, lease.pageNo)} isWhole={false} /> : <ScanMat lease={lease} turns={picture.turns} zoom={picture.zoom} />}
              {lease.crops.some(({ isDoubtful }) => isDoubtful) ? <CheckPosition isWhole={picture.isWhole} onWhole={whole} /> : null}
              <DeskTools lease={lease} isWhole={picture.isWhole} zoom={picture.zoom} onTurn={turn} onCloser={() => zoom(1.5)} onFarther={() => zoom(1 / 1.5)} onWhole={whole} />
              {shown.kind === 'done' ? (
                <View style={{ minHeight: isWide ? 240 : 168, gap: 12, padding: isWide ? 40 : 16, borderTopWidth: 1, borderColor: colors.hair }}>
                  <Text variant="head">{words.lookBack(lease.candidateNumber, saidText(shown.done.said), struckWords(shown.done.said.method ?? [], item.methodMarks))}</Text>
                  <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
                    <Button keyCap="U" icon="takeBack" onPress={takeBack}>
                      {words.takeBack(lease.candidateNumber)}
                    </Button>
                    <Button keyCap="Page Down" onPress={() => look(-1)}>
                      {words.lookOn}
                    </Button>
                  </View>
                </View>
              ) : (
                <DeskFoot
                  item={item}
                  text={text}
                  onText={type}
                  fieldRef={field}
                  note={note}
                  method={method}
                  isChoosingCode={open === 'other'}
                  chosenCode={code}
                  onChooseCode={setCode}
                  onOther={() => setOpen('other')}
                  onCancelOther={close}
                  onRecord={record}
                  onCode={sayCode}
                />
              )}
            </>
          ) : (
            <ItemEnd sittingId={sittingId} item={item} items={items} left={item.toRead - readHere} work={work} />
          )}
        </View>
        {isWide ? (
          <View style={{ width: 250, padding: 18, borderLeftWidth: 1, borderColor: colors.hair }}>
            <JustRead sittingId={sittingId} item={item} done={work.done} queue={work.justDone} onTakeBack={takeBack} />
          </View>
        ) : null}
      </View>
      {open === 'other' && !isWide ? (
        <CodeSheet
          onCode={sayCode}
          onNote={() => setOpen('note')}
          onTakeBack={
            last
              ? () => {
                  setOpen(null);
                  takeBack();
                }
              : null
          }
          takeBackLabel={words.takeBack(last?.lease.candidateNumber ?? '')}
          onClose={close}
          hint={words.typesLast(item.typesLast)}
        />
      ) : null}
      {open === 'note' ? (
        <NoteDialog
          note={note}
          onKeep={(kept) => {
            setNote(kept);
            close();
          }}
          onClose={close}
        />
      ) : null}
      {open === 'keys' ? <KeysDialog onClose={close} /> : null}
    </View>
  );
}
