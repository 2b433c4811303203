import { useLocalSearchParams } from 'expo-router';
import { PeopleScreen } from '../../../shared/screens/people/people-screen';

export default function People() {
  const { sitting } = useLocalSearchParams<{ sitting: string }>();
  return <PeopleScreen sittingId={sitting} />;
}
