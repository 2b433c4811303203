import { useLocalSearchParams } from 'expo-router';
import { DeskScreen } from '../../shared/screens/desk/desk-screen';

export default function Desk() {
  const { sitting, item } = useLocalSearchParams<{ sitting: string; item?: string }>();
  return <DeskScreen sittingId={sitting} itemId={item} />;
}
