import { keepPreviousData, queryOptions, useMutation, useQueries, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { LedgerChip, LedgerSort } from '../contracts/enums';
import type { AnswerView, getAnswerHistory, getLedger, getTotals, LedgerRow, makeExport, RulingBody } from '../contracts/ledger';
import type { ResponseOf } from '../contracts/route';
import { api, apiBlob } from './api';
import { windowRows, windowsFor, type Rows } from './ledger-windows';
import { progressQueryOptions } from './sittings';

export interface LedgerQuestion {
  readonly show: LedgerChip;
  readonly item: string | null;
  readonly find: string;
  readonly sort: LedgerSort;
  readonly direction: 'up' | 'down';
}

type LedgerWindow = ResponseOf<typeof getLedger>;

const lookAgainMs = 20_000;
const fileKeptMs = 60_000;

const addressOf = (sittingId: string, { show, item, find, sort, direction }: LedgerQuestion, offset: number): string => {
  const query = new URLSearchParams({ show, sort, direction, offset: String(offset), limit: String(windowRows) });
  if (item !== null) query.set('item', item);
  if (find.trim() !== '') query.set('find', find.trim());
  return `/sittings/${sittingId}/answers?${query.toString()}`;
};

const windowOptions = (sittingId: string, question: LedgerQuestion, index: number) =>
  queryOptions({
    queryKey: ['ledger', sittingId, question, index],
    refetchInterval: lookAgainMs,
    placeholderData: keepPreviousData,
    queryFn: ({ signal }) => api<LedgerWindow>(addressOf(sittingId, question, index * windowRows), { signal }),
  });

/** The windows of the ledger that hold the rows asked for, with the first window's counts. */
export function useLedger(sittingId: string, question: LedgerQuestion, ranges: readonly Rows[]) {
  const first = useQuery(windowOptions(sittingId, question, 0));
  const windows = windowsFor(ranges);
  const others = useQueries({ queries: windows.map((index) => windowOptions(sittingId, question, index)) });
  const byWindow = new Map<number, readonly LedgerRow[]>([[0, first.data?.rows ?? []]]);
  windows.forEach((index, at) => byWindow.set(index, others[at]?.data?.rows ?? []));
  return { first, rowAt: (row: number): LedgerRow | undefined => byWindow.get(Math.floor(row / windowRows))?.[row % windowRows] };
}

export const answerQueryOptions = (answerId: string) =>
  queryOptions({ queryKey: ['answer', answerId], queryFn: ({ signal }) => api<AnswerView>(`/answers/${answerId}`, { signal }) });

export const useAnswer = (answerId: string) => useQuery(answerQueryOptions(answerId));

export const useAnswerHistory = (answerId: string, isWanted: boolean) =>
  useQuery({ queryKey: ['answer-history', answerId], enabled: isWanted, queryFn: ({ signal }) => api<ResponseOf<typeof getAnswerHistory>>(`/answers/${answerId}/history`, { signal }) });

function keepAnswer(client: QueryClient, answer: AnswerView): void {
  client.setQueryData(answerQueryOptions(answer.answerId).queryKey, answer);
  void client.invalidateQueries({ queryKey: ['answer-history', answer.answerId] });
  void client.invalidateQueries({ queryKey: ['ledger', answer.sittingId] });
  void client.invalidateQueries({ queryKey: totalsQueryOptions(answer.sittingId).queryKey });
  void client.invalidateQueries({ queryKey: progressQueryOptions(answer.sittingId).queryKey });
  void client.invalidateQueries({ queryKey: ['waiting'] });
}

export function useThirdReading(answerId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, ...body }: { id: string; text?: string; code?: string; method: readonly string[]; openedAt: number }) => api<AnswerView>(`/answers/${answerId}/third-reading/${id}`, { method: 'PUT', body }),
    onSuccess: (answer) => keepAnswer(client, answer),
  });
}

export function useRule(answerId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ rev, body, once }: { rev: number; body: RulingBody; once: string }) => api<AnswerView>(`/answers/${answerId}/rulings`, { method: 'POST', rev, body, idempotencyKey: once }),
    onSuccess: (answer) => keepAnswer(client, answer),
    onError: () => client.invalidateQueries({ queryKey: answerQueryOptions(answerId).queryKey }),
  });
}

export function useTakeBackRuling() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (rulingId: string) => api<AnswerView>(`/rulings/${rulingId}/take-back`, { method: 'POST' }),
    onSuccess: (answer) => keepAnswer(client, answer),
  });
}

export const totalsQueryOptions = (sittingId: string) =>
  queryOptions({ queryKey: ['totals', sittingId], queryFn: ({ signal }) => api<ResponseOf<typeof getTotals>>(`/sittings/${sittingId}/totals`, { signal }) });

export const useTotals = (sittingId: string) => useQuery(totalsQueryOptions(sittingId));

/** Makes the file of the marks and gives it to the browser to save. */
export function useExportMarks(sittingId: string) {
  return useMutation({
    mutationFn: async () => {
      const { id, fileName } = await api<ResponseOf<typeof makeExport>>(`/sittings/${sittingId}/exports`, { method: 'POST', body: { kind: 'marks-csv' } });
      const url = URL.createObjectURL(await apiBlob(`/exports/${id}/file`));
      const link = document.createElement('a');
      link.href = url;
      link.download = fileName;
      link.click();
      // Some browsers read it only after the press has returned.
      setTimeout(() => URL.revokeObjectURL(url), fileKeptMs);
      return fileName;
    },
  });
}
