import { useLocalSearchParams } from 'expo-router';
import { SortingScreen } from '../../../shared/screens/sorting/sorting-screen';

export default function Sorting() {
  const { sitting } = useLocalSearchParams<{ sitting: string }>();
  return <SortingScreen sittingId={sitting} />;
}
