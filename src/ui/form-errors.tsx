import { useEffect, useRef } from 'react';

export interface FormFault {
  message: string;
  /** The field's label or its path, as "readings 3, halfAB". */
  field?: string;
}

/** The faults of a form that was refused, all at once; takes the focus so that they are read first. */
export function FormErrors({ faults, title }: { faults: readonly FormFault[]; title?: string }) {
  const box = useRef<HTMLDivElement>(null);
  const key = faults.map((fault) => `${fault.field ?? ''}:${fault.message}`).join('\n');
  useEffect(() => {
    if (key !== '') box.current?.focus();
  }, [key]);
  if (faults.length === 0) return null;
  return (
    <div
      ref={box}
      role="alert"
      tabIndex={-1}
      className="rounded border border-rust bg-rust-tint px-3 py-2 outline-offset-0"
    >
      <p className="font-semibold">
        {title ?? (faults.length === 1 ? 'Not saved' : `Not saved: ${faults.length} faults`)}
      </p>
      <ul className="mt-1">
        {faults.map((fault) => (
          <li key={`${fault.field ?? ''}:${fault.message}`}>
            {fault.field ? <span className="font-semibold">{fault.field}: </span> : null}
            {fault.message}
          </li>
        ))}
      </ul>
    </div>
  );
}
