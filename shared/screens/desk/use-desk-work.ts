import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useEffect, useRef, useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import { fetchLeases, giveBack, recentQueryOptions, standingQueryOptions, takeBack, useReadingQueue, warmPictures } from '../../client/desk';
import { meQueryOptions } from '../../client/session';
import { codeWords, words } from './words';
import { emptyWork, looking, onView, withLeases, withReading, withoutReading, withTakenBack, type OnView, type Said } from './work-list';

/** Answers held ahead, so that the next is there at once. */
const ahead = 5;
const fewest = 3;
/** As many as the server gives at once. */
const most = 20;

interface DeskPlace {
  readonly sittingId: string;
  readonly itemId: string;
  readonly personId: string;
}

export interface DeskWork {
  readonly shown: OnView;
  readonly justDone: ReturnType<typeof useReadingQueue>['view'];
  readonly done: typeof emptyWork.done;
  /** Nothing more is to be had for now. */
  readonly isAtEnd: boolean;
  readonly isFetching: boolean;
  readonly error: string | null;
  /** The last thing that happened, for the live region. */
  readonly message: string;
  /** What could not be done just now, in sight until the next act. */
  readonly problem: string | null;
  /** Whether the device has it; what it could not keep is still to be recorded. */
  record(said: Said): Promise<boolean>;
  /** Whether an answer came back. */
  takeBackLast(): Promise<boolean>;
  look(step: 1 | -1): void;
  fetchMore(): void;
  forgetRefused(id: string): void;
  sendRefused(id: string): void;
  /** To the sign-in, where the session has run out; what is kept goes afterwards. */
  signIn(): void;
}

/** The work of one item at the desk: leases ahead, readings into the queue, looking back, taking back. */
export function useDeskWork({ sittingId, itemId, personId }: DeskPlace): DeskWork {
  const client = useQueryClient();
  const { queue, view } = useReadingQueue(personId);
  const [work, setWork] = useState(emptyWork);
  const [isFetching, setFetching] = useState(false);
  const [isAtEnd, setAtEnd] = useState(false);
  const [error, setError] = useState<string | null>(null);
  const [message, setMessage] = useState('');
  const [problem, setProblem] = useState<string | null>(null);
  const opened = useRef(new Map<string, number>());
  const isBusy = useRef(false);
  const isEndOpen = useRef(false);
  const shown = onView(work);

  const fetchMore = useCallback(() => {
    if (isBusy.current) return;
    isBusy.current = true;
    setFetching(true);
    const askedAt = Date.now();
    const unsent = new Set([...queue.snapshot().waiting, ...queue.snapshot().refused].map(({ answerId }) => answerId));
    fetchLeases(itemId, Math.min(most, ahead + unsent.size))
      .then((leases) => {
        warmPictures(leases);
        setWork((before) => withLeases(before, leases, unsent, askedAt));
        // Where more wait here than can be asked for at once, the end is not known before they are sent.
        isEndOpen.current = ahead + unsent.size > most;
        setAtEnd(leases.every(({ answerId }) => unsent.has(answerId)));
        setError(null);
      })
      .catch((problem: unknown) => setError(problem instanceof Error ? problem.message : String(problem)))
      .finally(() => {
        isBusy.current = false;
        setFetching(false);
      });
  }, [itemId, queue]);

  const isLow = work.held.length < fewest;
  useEffect(() => {
    if (isLow && !isAtEnd && error === null) fetchMore();
  }, [isLow, isAtEnd, error, fetchMore, work.done.length]);
  // What came had been read by then.
  const isStarved = work.held.length === 0 && !isFetching;
  useEffect(() => {
    if (isStarved && !isAtEnd && error === null) fetchMore();
  }, [isStarved, isAtEnd, error, fetchMore]);

  useEffect(() => {
    if (shown.kind === 'next' && !opened.current.has(shown.lease.answerId)) opened.current.set(shown.lease.answerId, Date.now());
  });

  const held = useRef(work.held);
  useEffect(() => {
    held.current = work.held;
  });
  // Who leaves the item does not keep its answers from others.
  useEffect(() => () => held.current.forEach(({ id }) => giveBack(id)), []);

  const { recorded, recordedIds } = view;
  useEffect(() => {
    const last = work.done.find(({ readingId }) => readingId === recordedIds.at(-1));
    if (last) setMessage(words.recorded(last.lease.candidateNumber));
    // The server answers again, so what could not be fetched is asked for once more.
    setError(null);
    if (isEndOpen.current) setAtEnd(false);
    if (recorded > 0 && (isAtEnd || recorded % 10 === 0)) void client.invalidateQueries({ queryKey: standingQueryOptions(sittingId).queryKey });
    // eslint-disable-next-line react-hooks/exhaustive-deps -- said once for each reading the server took
  }, [recorded]);
  useEffect(() => {
    if (isAtEnd) void client.invalidateQueries({ queryKey: standingQueryOptions(sittingId).queryKey });
  }, [client, isAtEnd, sittingId]);

  const record = async (said: Said): Promise<boolean> => {
    if (shown.kind !== 'next' && shown.kind !== 'later') return false;
    const { lease } = shown;
    const id = uuidv7();
    const at = Date.now();
    try {
      await queue.keep({ id, sittingId, itemId, answerId: lease.answerId, leaseId: lease.id, candidateNumber: lease.candidateNumber, openedAt: opened.current.get(lease.answerId) ?? at, keptAt: at, ...said });
    } catch {
      setProblem(words.notKept);
      return false;
    }
    setProblem(null);
    setWork((before) => withReading(before, { readingId: id, lease, said, at }));
    return true;
  };

  const takeBackLast = async (): Promise<boolean> => {
    try {
      const refused = new Set(queue.snapshot().refused.map(({ id }) => id));
      const onLook = shown.kind === 'done' ? shown.done : work.done.filter(({ readingId }) => !refused.has(readingId)).at(-1);
      const recent = onLook ? undefined : (await client.fetchQuery(recentQueryOptions(sittingId, itemId))).readings[0];
      const [readingId, number] = onLook ? [onLook.readingId, onLook.lease.candidateNumber] : recent ? [recent.id, recent.candidateNumber] : [null, ''];
      if (readingId === null) return false;
      if (queue.snapshot().waiting.some(({ id }) => id === readingId)) {
        setProblem(words.notYetSent);
        return false;
      }
      const { lease } = await takeBack(readingId);
      if (lease) warmPictures([lease]);
      setWork((before) => withTakenBack(before, readingId, lease));
      setAtEnd(false);
      setMessage(lease ? words.taken(number) : '');
      setProblem(lease ? null : words.takenElsewhere(number));
      void client.invalidateQueries({ queryKey: recentQueryOptions(sittingId, itemId).queryKey });
      return lease !== null;
    } catch (refusal) {
      setProblem(refusal instanceof Error ? refusal.message : String(refusal));
      return false;
    }
  };

  return {
    shown,
    justDone: view,
    done: work.done,
    isAtEnd,
    isFetching,
    error,
    message,
    problem,
    record,
    takeBackLast,
    look: (step) => setWork((before) => looking(before, step)),
    fetchMore: () => {
      setAtEnd(false);
      setError(null);
      fetchMore();
    },
    forgetRefused: (id) => {
      setWork((before) => withoutReading(before, id));
      setAtEnd(false);
      void queue.forget(id);
    },
    sendRefused: (id) => void queue.sendAgain(id),
    signIn: () => {
      queue.tryAgain();
      void client.invalidateQueries({ queryKey: meQueryOptions().queryKey });
    },
  };
}

/** What was said of an answer, as the desk writes it. */
export const saidText = ({ text, code }: Said): string => (code === undefined ? (text ?? '') : codeWords[code]);
