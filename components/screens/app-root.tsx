import { QueryClientProvider } from '@tanstack/react-query';
import { Redirect, useGlobalSearchParams, usePathname, type Href } from 'expo-router';
import { useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { GestureHandlerRootView } from 'react-native-gesture-handler';
import { describeError } from '@/components/api/api-problem';
import { createQueryClient } from '@/components/api/query-client';
import { SessionProvider, useSessionState } from '@/components/api/session-provider';
import { ThemeDocument } from '@/components/theme/theme-document';
import { useTheme } from '@/components/theme/use-theme';
import { ErrorState, LoadingState } from '@/components/ui/states';
import { DoorFrame } from './door-frame';
import { homeOf, placeWithin } from './places';
import { RenewalDialog } from './renewal-dialog';

/** Screens that are shown to those who are not signed in; signed-in people are sent on. */
const DOORS = ['/sign-in', '/setup', '/forgotten'];
/** Links of mails: shown to everybody. */
const LINKS = ['/invitation/', '/password/'];
/** Not for those who only build from frozen revisions. */
const OF_JOBS = /^\/(jobs|parts)(\/|$)/;

/** What every screen stands in: theme, session, the server's answers, and who may see what. */
export function AppRoot({ children }: { readonly children: ReactNode }) {
  const [client] = useState(createQueryClient);
  return (
    <GestureHandlerRootView style={{ flex: 1 }}>
      <QueryClientProvider client={client}>
        <SessionProvider>
          <ThemeDocument />
          <Ground>
            <Doorkeeper>{children}</Doorkeeper>
          </Ground>
          <RenewalDialog />
        </SessionProvider>
      </QueryClientProvider>
    </GestureHandlerRootView>
  );
}

function Ground({ children }: { readonly children: ReactNode }) {
  const { color } = useTheme();
  return <View style={{ flex: 1, backgroundColor: color.ground }}>{children}</View>;
}

/** Sends the signed out to the sign-in, and back to where they wanted to go afterwards. */
function Doorkeeper({ children }: { readonly children: ReactNode }) {
  const { state } = useSessionState();
  const path = usePathname();
  const { search } = globalThis.location;
  const { next } = useGlobalSearchParams<{ next?: string }>();
  if (LINKS.some((link) => path.startsWith(link)) && state.status !== 'loading') return children;
  switch (state.status) {
    case 'loading':
      return (
        <DoorFrame title="Elbowroom">
          <LoadingState label="Opening" />
        </DoorFrame>
      );
    case 'unreachable':
      return (
        <DoorFrame title="Elbowroom">
          <ErrorState
            title="The server did not answer"
            text={describeError(state.error)}
            onRetry={state.retry}
          />
        </DoorFrame>
      );
    case 'signed-out':
      if (DOORS.includes(path)) return children;
      // Whoever signed out meant to leave: the next one begins at the start.
      return (
        <Redirect
          href={
            path === '/' || state.left
              ? '/sign-in'
              : `/sign-in?next=${encodeURIComponent(`${path}${search}`)}`
          }
        />
      );
    case 'signed-in': {
      const { seeJobs } = state.session.abilities;
      if (!seeJobs && OF_JOBS.test(path)) return <Redirect href={homeOf(state.session)} />;
      if (path !== '/' && !DOORS.includes(path)) return children;
      return <Redirect href={(placeWithin(next) ?? homeOf(state.session)) as Href} />;
    }
  }
}
