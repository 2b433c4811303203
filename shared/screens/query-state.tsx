import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Button } from '../ui/button';
import { Failed, Loading } from '../ui/page-state';

interface QueryStateProps<Data> {
  readonly query: UseQueryResult<Data>;
  /** What is being fetched, as in "Fetching the class list". */
  readonly fetching: string;
  readonly failed: string;
  /** Lines to draw at once where a list will stand. */
  readonly rows?: number;
  readonly children: (data: Data) => ReactNode;
}

/** Loading says nothing at first, then one line; what failed says so, with one way on; what was fetched stays while it is looked at again. */
export function QueryState<Data>({ query, fetching, failed, rows = 0, children }: QueryStateProps<Data>) {
  if (query.data !== undefined) return <>{children(query.data)}</>;
  if (!query.isError) return <Loading rows={rows}>{fetching}</Loading>;
  return (
    <Failed
      head={failed}
      action={
        <Button onPress={() => void query.refetch()} isBusy={query.isFetching}>
          Try again
        </Button>
      }
    >
      {query.error.message}
    </Failed>
  );
}
