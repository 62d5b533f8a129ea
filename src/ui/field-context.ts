import { createContext, useContext } from 'react';

export interface FieldWiring {
  controlId: string;
  describedBy: string | undefined;
  invalid: boolean;
  required: boolean;
}

export const FieldContext = createContext<FieldWiring | null>(null);

interface OwnWiring {
  id?: string | undefined;
  required?: boolean | undefined;
  'aria-describedby'?: string | undefined;
  'aria-invalid'?: boolean | 'true' | 'false' | 'grammar' | 'spelling' | undefined;
}

/** Attributes that tie a control to the Field around it; what the control is given itself wins. */
export function useFieldControl(own: OwnWiring) {
  const field = useContext(FieldContext);
  const describedBy = [field?.describedBy, own['aria-describedby']].filter(Boolean).join(' ');
  return {
    id: own.id ?? field?.controlId,
    'aria-describedby': describedBy === '' ? undefined : describedBy,
    'aria-invalid': own['aria-invalid'] ?? (field?.invalid ? true : undefined),
    'aria-required': field?.required || own.required ? true : undefined,
  } as const;
}
