import type { ComponentPropsWithRef, ReactNode } from 'react';
import { Link, type LinkProps } from 'react-router-dom';
import { classNames } from './class-names';

export type ButtonKind = 'main' | 'plain' | 'quiet' | 'danger';
export type ButtonSize = 'regular' | 'small';

const KIND: Record<ButtonKind, string> = {
  main: 'border-copper bg-copper text-on-copper hover:border-copper-strong hover:bg-copper-strong',
  plain: 'border-ink bg-sheet text-ink hover:bg-sunken',
  quiet: 'border-transparent bg-transparent text-ink hover:bg-sunken',
  danger: 'border-rust bg-sheet text-rust hover:bg-rust-tint',
};

const SIZE: Record<ButtonSize, string> = {
  regular: 'min-h-8 px-3.5 py-1 text-base touch:min-h-11',
  small: 'min-h-7 px-2 py-0.5 text-sm touch:min-h-11',
};

export function buttonClass(kind: ButtonKind, size: ButtonSize, extra?: string): string {
  return classNames(
    'inline-flex items-center justify-center gap-1.5 rounded border text-center leading-tight no-underline select-none print:hidden',
    'disabled:cursor-not-allowed disabled:opacity-55 aria-disabled:cursor-not-allowed aria-disabled:opacity-55',
    KIND[kind],
    SIZE[size],
    extra,
  );
}

export interface ButtonProps extends ComponentPropsWithRef<'button'> {
  kind?: ButtonKind;
  size?: ButtonSize;
  /** Work is under way: the button keeps its place and focus but cannot be pressed again. */
  loading?: boolean;
  icon?: ReactNode;
}

export function Button({
  kind = 'plain',
  size = 'regular',
  loading = false,
  icon,
  className,
  children,
  onClick,
  type = 'button',
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={type === 'submit' && !loading ? 'submit' : type === 'reset' ? 'reset' : 'button'}
      aria-busy={loading || undefined}
      aria-disabled={loading || rest['aria-disabled']}
      onClick={loading ? undefined : onClick}
      className={buttonClass(kind, size, className)}
    >
      {loading ? <WorkingMark /> : icon}
      {children}
    </button>
  );
}

function WorkingMark() {
  return (
    <span
      aria-hidden
      className="size-3 shrink-0 animate-spin rounded-full border-2 border-current border-r-transparent"
    />
  );
}

export interface ButtonLinkProps extends LinkProps {
  kind?: ButtonKind;
  size?: ButtonSize;
}

/** A link that looks like a button, for going somewhere rather than doing something. */
export function ButtonLink({ kind = 'plain', size = 'regular', className, ...rest }: ButtonLinkProps) {
  return <Link {...rest} className={buttonClass(kind, size, className)} />;
}
