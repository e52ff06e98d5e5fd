import { Navigator, Slot, type ErrorBoundaryProps } from 'expo-router';
import { AppRoot } from '@/components/screens/app-root';
import { PageErrorScreen } from '@/components/screens/page-error-screen';

/** The navigator stays while the root shows something else than its screen, else every redirect would begin anew. */
export default function RootLayout() {
  return (
    <Navigator>
      <AppRoot>
        <Slot />
      </AppRoot>
    </Navigator>
  );
}

/** What is shown when a screen breaks or its part of the program does not arrive. */
export function ErrorBoundary({ error }: ErrorBoundaryProps) {
  return <PageErrorScreen error={error} />;
}
