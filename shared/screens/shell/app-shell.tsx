import { QueryClientProvider } from '@tanstack/react-query';
import { Redirect, usePathname, useRouter } from 'expo-router';
import { useEffect, useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { sendReadingsOf } from '../../client/desk';
import { createQueryClient } from '../../client/query-client';
import { useMe } from '../../client/session';
import { adoptGlobalStyle } from '../../ui/global-style';
import { LinkProvider } from '../../ui/link';
import { useShippedFonts } from '../../ui/fonts';
import { ThemeProvider, useColors } from '../../ui/theme';
import { ToastProvider } from '../../ui/toast';
import { QueryState } from '../query-state';

adoptGlobalStyle();

/** What stands round every screen: fonts, theme, server data, links, and the door. */
export function AppShell({ children }: { children: ReactNode }) {
  const [client] = useState(createQueryClient);
  const router = useRouter();
  const hasFonts = useShippedFonts();
  return (
    <ThemeProvider>
      <QueryClientProvider client={client}>
        <LinkProvider navigate={(href) => router.push(href as never)}>
          <ToastProvider>
            <Ground>{hasFonts ? <Door>{children}</Door> : null}</Ground>
          </ToastProvider>
        </LinkProvider>
      </QueryClientProvider>
    </ThemeProvider>
  );
}

function Ground({ children }: { children: ReactNode }) {
  const colors = useColors();
  return <View style={{ flex: 1, minHeight: 0, backgroundColor: colors.paper }}>{children}</View>;
}

/** Sends who is not signed in to the sign-in screen, and back. It hides screens; the server guards the data. */
function Door({ children }: { children: ReactNode }) {
  const me = useMe();
  const isAtDoor = usePathname() === '/sign-in';
  const who = me.data === undefined ? undefined : (me.data?.id ?? null);
  useEffect(() => {
    if (who !== undefined) sendReadingsOf(who);
  }, [who]);
  return (
    <QueryState query={me} fetching="Looking whether you are signed in" failed="The server does not answer.">
      {(person) => {
        if (person === null && !isAtDoor) return <Redirect href="/sign-in" />;
        if (person !== null && isAtDoor) return <Redirect href="/" />;
        return children;
      }}
    </QueryState>
  );
}
