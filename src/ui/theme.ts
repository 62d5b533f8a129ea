import { useSyncExternalStore } from 'react';

export type ThemeChoice = 'system' | 'light' | 'dark';

const KEY = 'layerwell-theme';
const listeners = new Set<() => void>();

export function readThemeChoice(): ThemeChoice {
  const stored = readStored();
  return stored === 'light' || stored === 'dark' ? stored : 'system';
}

/** Marks the document; "system" leaves the choice to the reader's own settings. */
export function applyTheme(choice: ThemeChoice = readThemeChoice()): void {
  if (choice === 'system') delete document.documentElement.dataset['theme'];
  else document.documentElement.dataset['theme'] = choice;
}

export function chooseTheme(choice: ThemeChoice): void {
  try {
    if (choice === 'system') localStorage.removeItem(KEY);
    else localStorage.setItem(KEY, choice);
  } catch {
    // Storage may be closed to the page; the choice then lasts until it is left.
  }
  applyTheme(choice);
  listeners.forEach((listener) => listener());
}

function readStored(): string | null {
  try {
    return localStorage.getItem(KEY);
  } catch {
    return null;
  }
}

const darkQuery = () => window.matchMedia('(prefers-color-scheme: dark)');
const printQuery = () => window.matchMedia('print');

function subscribe(listener: () => void): () => void {
  const queries = [darkQuery(), printQuery()];
  listeners.add(listener);
  queries.forEach((query) => query.addEventListener('change', listener));
  return () => {
    listeners.delete(listener);
    queries.forEach((query) => query.removeEventListener('change', listener));
  };
}

export function useThemeChoice(): ThemeChoice {
  return useSyncExternalStore(subscribe, currentChoice);
}

/** The theme as seen, for drawings that cannot follow CSS variables by themselves; paper is light. */
export function useIsDark(): boolean {
  return useSyncExternalStore(subscribe, () => {
    if (printQuery().matches) return false;
    const choice = currentChoice();
    return choice === 'system' ? darkQuery().matches : choice === 'dark';
  });
}

function currentChoice(): ThemeChoice {
  const marked = document.documentElement.dataset['theme'];
  return marked === 'light' || marked === 'dark' ? marked : 'system';
}
