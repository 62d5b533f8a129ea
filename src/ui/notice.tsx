import type { ReactNode } from 'react';
import { classNames } from './class-names';

export interface NoticeProps {
  tone?: 'note' | 'caution' | 'fault';
  title?: ReactNode;
  children: ReactNode;
  actions?: ReactNode;
}

const TONE = {
  note: 'border-l-water',
  caution: 'border-l-copper',
  fault: 'border-l-rust bg-rust-tint',
} as const;

/** Words that stand in the page beside what they are about. */
export function Notice({ tone = 'note', title, children, actions }: NoticeProps) {
  return (
    <div
      role={tone === 'fault' ? 'alert' : undefined}
      className={classNames('border-l-2 py-1 pr-3 pl-3', TONE[tone])}
    >
      {title ? <p className="font-semibold">{title}</p> : null}
      <div>{children}</div>
      {actions ? <div className="mt-2 flex flex-wrap gap-2">{actions}</div> : null}
    </div>
  );
}
