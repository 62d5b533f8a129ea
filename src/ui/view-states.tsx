import type { ReactNode } from 'react';
import { Button, ButtonLink } from './button';

interface StateFrameProps {
  title: ReactNode;
  children?: ReactNode;
  actions?: ReactNode;
  role?: 'alert' | 'status';
}

function StateFrame({ title, children, actions, role }: StateFrameProps) {
  return (
    <div role={role} className="mx-auto flex w-full max-w-lg flex-col items-start gap-2 px-4 py-12">
      <h2 className="text-lg font-semibold">{title}</h2>
      {children ? <div className="text-muted">{children}</div> : null}
      {actions ? <div className="mt-2 flex flex-wrap gap-2">{actions}</div> : null}
    </div>
  );
}

/** Nothing here yet, why, and the first thing to do. */
export function EmptyState(props: { title: ReactNode; children?: ReactNode; actions?: ReactNode }) {
  return <StateFrame {...props} />;
}

export interface ErrorStateProps {
  title?: string;
  /** What went wrong, in the server's own words. */
  message: ReactNode;
  /** For a report: the error's code. */
  code?: string;
  onRetry?: () => void;
}

export function ErrorState({ title = 'This could not be shown', message, code, onRetry }: ErrorStateProps) {
  return (
    <StateFrame
      role="alert"
      title={title}
      actions={onRetry ? <Button onClick={onRetry}>Try again</Button> : null}
    >
      <p>{message}</p>
      {code ? <p className="figure mt-1 text-sm">{code}</p> : null}
    </StateFrame>
  );
}

/** Seen but not allowed: says who may. */
export function NoPermissionState({ children }: { children?: ReactNode }) {
  return (
    <StateFrame title="Your role does not allow this" actions={<ButtonLink to="/">To my surveys</ButtonLink>}>
      {children ?? 'Ask the lead of the survey to change your role.'}
    </StateFrame>
  );
}

export interface LoadingStateProps {
  /** What is being fetched, as "Loading soundings". */
  label: string;
  lines?: number;
}

/** The page's own shape in grey, so that nothing jumps when the data come. */
export function LoadingState({ label, lines = 6 }: LoadingStateProps) {
  return (
    <output className="flex w-full flex-col gap-3 px-4 py-6">
      <span className="sr-only">{label}</span>
      {Array.from({ length: lines }, (_, line) => (
        <Skeleton
          key={line}
          className={['w-2/5', 'w-full', 'w-11/12', 'w-4/5'][line === 0 ? 0 : 1 + (line % 3)]}
        />
      ))}
    </output>
  );
}

export function Skeleton({ className = 'w-full' }: { className?: string | undefined }) {
  return <span aria-hidden className={`block h-3.5 animate-pulse rounded-sm bg-rule ${className}`} />;
}
