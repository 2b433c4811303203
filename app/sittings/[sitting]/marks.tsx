import { useLocalSearchParams } from 'expo-router';
import { MarksScreen } from '../../../shared/screens/marks/marks-screen';

export default function Marks() {
  const { sitting } = useLocalSearchParams<{ sitting: string }>();
  return <MarksScreen sittingId={sitting} />;
}
