import type { ReactNode } from 'react';

export function Kbd({ children }: { children: ReactNode }) {
  return (
    <kbd className="figure inline-block rounded border border-rule bg-sheet px-1.5 text-xs leading-5 text-ink">
      {children}
    </kbd>
  );
}
