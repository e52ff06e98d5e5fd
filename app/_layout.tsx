import { Slot } from 'expo-router';
import { AppRoot } from '@/components/screens/app-root';

export default function RootLayout() {
  return (
    <AppRoot>
      <Slot />
    </AppRoot>
  );
}
