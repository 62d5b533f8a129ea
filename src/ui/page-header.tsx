import type { ReactNode } from 'react';

export interface PageHeaderProps {
  title: ReactNode;
  /** A line of facts under the title. */
  note?: ReactNode;
  actions?: ReactNode;
}

export function PageHeader({ title, note, actions }: PageHeaderProps) {
  return (
    <div className="mb-5 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
      <div className="min-w-0">
        <h1 className="text-xl font-semibold">{title}</h1>
        {note ? <p className="mt-0.5 text-muted">{note}</p> : null}
      </div>
      {actions ? <div className="flex flex-wrap items-center gap-2">{actions}</div> : null}
    </div>
  );
}
