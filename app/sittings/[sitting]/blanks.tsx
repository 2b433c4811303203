import { useLocalSearchParams } from 'expo-router';
import { BlanksScreen } from '../../../shared/screens/blanks/blanks-screen';

export default function Blanks() {
  const { sitting } = useLocalSearchParams<{ sitting: string }>();
  return <BlanksScreen sittingId={sitting} />;
}
