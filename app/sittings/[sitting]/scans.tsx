import { useLocalSearchParams } from 'expo-router';
import { TrayScreen } from '../../../shared/screens/tray/tray-screen';

export default function Scans() {
  const { sitting } = useLocalSearchParams<{ sitting: string }>();
  return <TrayScreen sittingId={sitting} />;
}
