import { useLocalSearchParams } from 'expo-router';
import { ByHandScreen } from '../../../shared/screens/people/by-hand-screen';

export default function ByHand() {
  const { sitting } = useLocalSearchParams<{ sitting: string }>();
  return <ByHandScreen sittingId={sitting} />;
}
