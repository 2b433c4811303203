import { useEffect, useMemo, useReducer, useState } from 'react';
import { ApiError } from '../../client/api';
import { useSaveLayout, useSendSample } from '../../client/layouts';
import type { LayoutView } from '../../contracts/layouts';
import { isUnsaved, regionsOf, regionsReducer, sentOf, type RegionsAct, type RegionsState } from './regions-state';

/** What was drawn and not stored outlives a look at another screen, as long as this page stays open. */
const unsavedOf = new Map<string, RegionsState>();

export interface Regions {
  readonly state: RegionsState;
  readonly dispatch: (act: RegionsAct) => void;
  readonly hasUnsaved: boolean;
  readonly isSaving: boolean;
  readonly savedAt: number | null;
  readonly errors: Readonly<Record<string, string>>;
  readonly message: string | null;
  /** Set while someone else's regions stand on the server. */
  readonly theirs: LayoutView | null;
  readonly isSendingSample: boolean;
  save(): void;
  takeTheirs(): void;
  keepMine(): void;
  sendSample(file: Blob): void;
}

/** The drawing of a paper's regions, stored when told to. */
export function useRegions(sittingId: string, layout: LayoutView, items: readonly string[]): Regions {
  const reducer = useMemo(() => regionsReducer(items), [items]);
  const [state, dispatch] = useReducer(reducer, null, () => unsavedOf.get(sittingId) ?? regionsOf(layout));
  const [savedAt, setSavedAt] = useState<number | null>(null);
  const storing = useSaveLayout(sittingId);
  const sending = useSendSample(sittingId);
  const hasUnsaved = isUnsaved(state);

  useEffect(() => {
    if (!hasUnsaved) {
      unsavedOf.delete(sittingId);
      return undefined;
    }
    unsavedOf.set(sittingId, state);
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [sittingId, state, hasUnsaved]);

  useEffect(() => {
    if (!hasUnsaved && layout.rev > state.rev) dispatch({ act: 'stored', layout });
  }, [layout, hasUnsaved, state.rev]);

  const store = (rev: number) =>
    storing.mutate(
      { rev, body: sentOf(state) },
      {
        onSuccess: (stored) => {
          dispatch({ act: 'stored', layout: stored });
          setSavedAt(Date.now());
        },
      },
    );

  const failure = storing.error ?? sending.error;
  const refusal = failure instanceof ApiError ? failure : null;
  const theirs = refusal?.code === 'conflict' && refusal.current ? (refusal.current as LayoutView) : null;
  return {
    state,
    dispatch: (act) => {
      if (act.act !== 'select' && storing.error) storing.reset();
      dispatch(act);
    },
    hasUnsaved,
    isSaving: storing.isPending,
    savedAt,
    errors: refusal?.fields ?? {},
    message: theirs ? null : (failure?.message ?? null),
    theirs,
    isSendingSample: sending.isPending,
    save: () => store(state.rev),
    takeTheirs: () => {
      if (theirs) dispatch({ act: 'stored', layout: theirs });
      storing.reset();
    },
    keepMine: () => {
      if (theirs) store(theirs.rev);
    },
    sendSample: (file) => {
      sending.mutate({ pageNo: state.pageNo, file }, { onSuccess: (stored) => dispatch({ act: 'pages-stored', layout: stored }) });
    },
  };
}
