import { useLocalSearchParams } from 'expo-router';
import { ClassListScreen } from '../../../shared/screens/class-list/class-list-screen';

export default function ClassList() {
  const { sitting } = useLocalSearchParams<{ sitting: string }>();
  return <ClassListScreen sittingId={sitting} />;
}
