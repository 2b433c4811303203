import { useLocalSearchParams } from 'expo-router';
import { OverviewScreen } from '../../../shared/screens/overview/overview-screen';

export default function Overview() {
  const { sitting } = useLocalSearchParams<{ sitting: string }>();
  return <OverviewScreen sittingId={sitting} />;
}
