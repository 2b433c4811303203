import { View } from 'react-native';
import { Link } from '../../ui/link';
import { Text } from '../../ui/text';

/** An address that leads nowhere, with the way home. */
export function NotFoundScreen() {
  return (
    <View role="main" style={{ flex: 1, padding: 32, gap: 12, maxWidth: 560 }}>
      <Text variant="title" level={1}>
        There is nothing at this address
      </Text>
      <Text>The page was moved, or it is not yours to see.</Text>
      <Link href="/" style={() => ({ minHeight: 44, justifyContent: 'center' })}>
        <Text weight={600} tone="manganate">
          Go to the bench
        </Text>
      </Link>
    </View>
  );
}
