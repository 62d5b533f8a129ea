import type { ComponentPropsWithRef } from 'react';
import { classNames } from './class-names';
import { CONTROL_CLASS } from './control-class';
import { useFieldControl } from './field-context';

export interface InputProps extends ComponentPropsWithRef<'input'> {
  /** Sets the text in Plex Mono, for codes and numbers. */
  figures?: boolean;
}

export function Input({ figures = false, className, ...rest }: InputProps) {
  const wiring = useFieldControl(rest);
  return (
    <input
      type="text"
      {...rest}
      {...wiring}
      className={classNames(CONTROL_CLASS, figures && 'figure', className)}
    />
  );
}
