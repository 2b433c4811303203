import { Slot } from 'expo-router';
import { AppShell } from '../shared/screens/shell/app-shell';

export default function RootLayout() {
  return (
    <AppShell>
      <Slot />
    </AppShell>
  );
}
