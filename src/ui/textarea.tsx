import type { ComponentPropsWithRef } from 'react';
import { classNames } from './class-names';
import { CONTROL_CLASS } from './control-class';
import { useFieldControl } from './field-context';

export function Textarea({ className, rows = 4, ...rest }: ComponentPropsWithRef<'textarea'>) {
  const wiring = useFieldControl(rest);
  return (
    <textarea rows={rows} {...rest} {...wiring} className={classNames(CONTROL_CLASS, 'py-2', className)} />
  );
}
