import { useLocalSearchParams } from 'expo-router';
import { NumbersScreen } from '../../../shared/screens/people/numbers-screen';

export default function Numbers() {
  const { sitting } = useLocalSearchParams<{ sitting: string }>();
  return <NumbersScreen sittingId={sitting} />;
}
