import type { UseQueryResult } from '@tanstack/react-query';
import { useEffect, useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { Button } from '../ui/button';
import { Text } from '../ui/text';
import { motion } from '../ui/tokens';
import { BrokenSign } from '../ui/vessel';

interface QueryStateProps<Data> {
  readonly query: UseQueryResult<Data>;
  /** What is being fetched, as in "Fetching the class list". */
  readonly fetching: string;
  readonly failed: string;
  readonly children: (data: Data) => ReactNode;
}

/** Loading says nothing at first, then one line; what failed says so, with one way on; what was fetched stays while it is looked at again. */
export function QueryState<Data>({ query, fetching, failed, children }: QueryStateProps<Data>) {
  if (query.data !== undefined) return <>{children(query.data)}</>;
  if (query.isError) {
    return (
      <View role="alert" style={{ padding: 32, gap: 12, alignItems: 'flex-start', maxWidth: 560 }}>
        <View style={{ flexDirection: 'row', gap: 10, alignItems: 'center' }}>
          <BrokenSign />
          <Text variant="head" level={2}>
            {failed}
          </Text>
        </View>
        <Text>{query.error.message}</Text>
        <Button onPress={() => void query.refetch()} isBusy={query.isFetching}>
          Try again
        </Button>
      </View>
    );
  }
  return <Fetching>{fetching}</Fetching>;
}

function Fetching({ children }: { children: string }) {
  const [isLong, setLong] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setLong(true), motion.loadingWordsMs);
    return () => clearTimeout(timer);
  }, []);
  return (
    <View aria-busy style={{ padding: 32, minHeight: 120 }}>
      {isLong ? (
        <Text variant="small" tone="ink2" live="polite">
          {children}
        </Text>
      ) : null}
    </View>
  );
}
