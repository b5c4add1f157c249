import { useSyncExternalStore } from 'react';

/** What a reader sets for this device: the theme and the units on screen. Kept here, never sent anywhere. */
export const THEMES = ['paper', 'dusk', 'night'] as const;
export type Theme = (typeof THEMES)[number];
export type Units = 'us' | 'metric';

export interface ReaderSettings {
  /** `system` is dusk where the system is dark, else paper; night is only by choice. */
  readonly theme: Theme | 'system';
  /** `basis` reads in the units of the vessel's basis. */
  readonly units: Units | 'basis';
}

const PLACE = 'ampwright.reader';
const DEFAULTS: ReaderSettings = { theme: 'system', units: 'basis' };
const systemIsDark = matchMedia('(prefers-color-scheme: dark)');
const listeners = new Set<() => void>();
let settings = read();

/** Puts the theme on the page and keeps it there; called before anything is drawn. */
export function startTheme(): void {
  showTheme();
  systemIsDark.addEventListener('change', () => {
    showTheme();
    tell();
  });
  // Another tab of the same reader has changed them.
  addEventListener('storage', (event) => {
    if (event.key !== PLACE) return;
    settings = read();
    showTheme();
    tell();
  });
}

export function changeReaderSettings(changes: Partial<ReaderSettings>): void {
  settings = { ...settings, ...changes };
  try {
    localStorage.setItem(PLACE, JSON.stringify(settings));
  } catch {
    // A device that keeps nothing still shows the choice until the page is left.
  }
  showTheme();
  tell();
}

export function useReaderSettings(): ReaderSettings {
  return useSyncExternalStore(listen, () => settings);
}

/** The theme that is shown, for what cannot be drawn with CSS variables. */
export function useShownTheme(): Theme {
  return useSyncExternalStore(listen, shownTheme);
}

/** The units of the reader, else of the basis. */
export function useUnits(basisUnits: Units): Units {
  const { units } = useReaderSettings();
  return units === 'basis' ? basisUnits : units;
}

function shownTheme(): Theme {
  if (settings.theme !== 'system') return settings.theme;
  return systemIsDark.matches ? 'dusk' : 'paper';
}

function showTheme(): void {
  document.documentElement.dataset.theme = shownTheme();
}

function listen(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

function tell(): void {
  for (const listener of listeners) listener();
}

function read(): ReaderSettings {
  try {
    const kept: unknown = JSON.parse(localStorage.getItem(PLACE) ?? 'null');
    if (typeof kept !== 'object' || kept === null) return DEFAULTS;
    const { theme, units } = kept as Partial<ReaderSettings>;
    return {
      theme: theme === 'system' || THEMES.some((known) => known === theme) ? theme! : DEFAULTS.theme,
      units: units === 'us' || units === 'metric' ? units : DEFAULTS.units,
    };
  } catch {
    return DEFAULTS;
  }
}
