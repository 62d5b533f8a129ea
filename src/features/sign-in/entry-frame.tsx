import type { ReactNode } from 'react';
import { PageFrame } from '../../app/page-frame';

interface EntryFrameProps {
  title: string;
  /** A line under the title. */
  note?: ReactNode;
  children: ReactNode;
}

/** A narrow sheet for the pages before sign-in. */
export function EntryFrame({ title, note, children }: EntryFrameProps) {
  return (
    <PageFrame title={title}>
      <div className="mx-auto flex w-full max-w-sm flex-col gap-5 pt-[6vh]">
        <div>
          <h1 className="text-2xl font-semibold">{title}</h1>
          {note ? <p className="mt-1.5 text-muted">{note}</p> : null}
        </div>
        {children}
      </div>
    </PageFrame>
  );
}
