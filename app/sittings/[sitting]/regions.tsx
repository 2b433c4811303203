import { useLocalSearchParams } from 'expo-router';
import { RegionsScreen } from '../../../shared/screens/regions/regions-screen';

export default function Regions() {
  const { sitting } = useLocalSearchParams<{ sitting: string }>();
  return <RegionsScreen sittingId={sitting} />;
}
