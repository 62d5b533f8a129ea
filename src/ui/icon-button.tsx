import type { ComponentPropsWithRef, ReactNode } from 'react';
import { classNames } from './class-names';

export interface IconButtonProps extends Omit<ComponentPropsWithRef<'button'>, 'children'> {
  /** Said to screen readers and shown as the browser's own hint. */
  label: string;
  icon: ReactNode;
}

export function IconButton({ label, icon, className, ...rest }: IconButtonProps) {
  return (
    <button
      type="button"
      title={label}
      {...rest}
      aria-label={label}
      className={classNames(
        'inline-flex size-8 shrink-0 items-center justify-center rounded text-muted hover:bg-sunken hover:text-ink touch:size-11 print:hidden',
        'disabled:cursor-not-allowed disabled:opacity-55 aria-disabled:cursor-not-allowed aria-disabled:opacity-55',
        className,
      )}
    >
      {icon}
    </button>
  );
}
