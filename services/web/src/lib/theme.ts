/** Light, dark, or as the system says; kept in this browser only. */
import { useSyncExternalStore } from 'react';

export const themes = ['system', 'light', 'dark'] as const;
export type Theme = (typeof themes)[number];

const KEY = 'cairnstep-theme';
const listeners = new Set<() => void>();

let current = readKept();

export function chooseTheme(theme: Theme): void {
  current = theme;
  try {
    localStorage.setItem(KEY, theme);
  } catch {
    // Storage may be closed to this page: chosen for this visit only.
  }
  applyTheme();
  for (const listener of listeners) listener();
}

/** `system` leaves the attribute away, so that the style sheet follows the system. */
export function applyTheme(): void {
  if (current === 'system') delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = current;
}

export function useTheme(): Theme {
  return useSyncExternalStore(subscribe, () => current);
}

function readKept(): Theme {
  try {
    const kept = localStorage.getItem(KEY);
    return themes.find((theme) => theme === kept) ?? 'system';
  } catch {
    return 'system';
  }
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
