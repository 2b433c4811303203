import { useLocalSearchParams } from 'expo-router';
import { LedgerScreen } from '../../../shared/screens/moderation/ledger-screen';

export default function Moderation() {
  const { sitting } = useLocalSearchParams<{ sitting: string }>();
  return <LedgerScreen sittingId={sitting} />;
}
