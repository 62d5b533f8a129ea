import type { ReactNode } from 'react';

export interface FigureItem {
  value: ReactNode;
  label: ReactNode;
}

/** A few numbers that matter, between two rules. */
export function FigureStrip({ items }: { items: readonly FigureItem[] }) {
  return (
    <dl className="flex flex-wrap gap-x-8 border-y border-rule">
      {items.map((item, index) => (
        <div key={index} className="flex min-w-20 flex-1 flex-col-reverse py-2">
          <dt className="text-sm text-muted">{item.label}</dt>
          <dd className="figure text-xl whitespace-nowrap">{item.value}</dd>
        </div>
      ))}
    </dl>
  );
}
