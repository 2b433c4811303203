import { useLocalSearchParams } from 'expo-router';
import { PaperScreen } from '../../../shared/screens/paper/paper-screen';

export default function Paper() {
  const { sitting, item } = useLocalSearchParams<{ sitting: string; item?: string }>();
  return <PaperScreen sittingId={sitting} itemId={item ?? null} />;
}
