import { useLocalSearchParams } from 'expo-router';
import { SheetsScreen } from '../../../shared/screens/sheets/sheets-screen';

export default function Sheets() {
  const { sitting } = useLocalSearchParams<{ sitting: string }>();
  return <SheetsScreen sittingId={sitting} />;
}
