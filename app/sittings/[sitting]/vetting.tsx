import { useLocalSearchParams } from 'expo-router';
import { VettingScreen } from '../../../shared/screens/vetting/vetting-screen';

export default function Vetting() {
  const { sitting } = useLocalSearchParams<{ sitting: string }>();
  return <VettingScreen sittingId={sitting} />;
}
