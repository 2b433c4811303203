import { createContext, useContext, useEffect, useMemo, useState, type ReactNode } from 'react';
import { useColorScheme } from 'react-native';
import { adoptGlobalStyle } from './global-style';
import { readStored, store } from './stored';
import { palettes, type Colors } from './tokens';
import { useMedia } from './use-media';

export const themePreferences = ['device', 'light', 'dark'] as const;
export type ThemePreference = (typeof themePreferences)[number];

interface Theme {
  readonly colors: Colors;
  readonly scheme: 'light' | 'dark';
  readonly preference: ThemePreference;
  setPreference(preference: ThemePreference): void;
}

const stored = 'meniscus.theme';
const ThemeContext = createContext<Theme | null>(null);

const storedPreference = (): ThemePreference => themePreferences.find((known) => known === readStored(stored)) ?? 'device';

/** Colours for everything below it: as the device, or as chosen. */
export function ThemeProvider({ children }: { children: ReactNode }) {
  const device = useColorScheme();
  const [preference, setPreference] = useState(storedPreference);
  // Where the device forces its own colours, the drawings have to stand on them.
  const isForced = useMedia('(forced-colors: active)', false);
  const scheme = preference === 'device' || isForced ? (device === 'dark' ? 'dark' : 'light') : preference;
  const colors = palettes[scheme];

  useEffect(() => {
    adoptGlobalStyle();
    const { style } = document.documentElement;
    style.colorScheme = scheme;
    style.backgroundColor = colors.bench;
    style.setProperty('--focus', colors.manganate);
    style.setProperty('--scrim', colors.scrim);
    style.setProperty('--hair', colors.hair);
    style.setProperty('--rule', colors.rule);
    document.querySelector('meta[name="theme-color"]')?.setAttribute('content', colors.paper);
  }, [scheme, colors]);

  const theme = useMemo(
    () => ({
      colors,
      scheme,
      preference,
      setPreference: (next: ThemePreference) => {
        store(stored, next);
        setPreference(next);
      },
    }),
    [colors, scheme, preference],
  );
  return <ThemeContext.Provider value={theme}>{children}</ThemeContext.Provider>;
}

export function useTheme(): Theme {
  const theme = useContext(ThemeContext);
  if (!theme) throw new Error('A component of the kit stands outside ThemeProvider.');
  return theme;
}

export const useColors = (): Colors => useTheme().colors;
