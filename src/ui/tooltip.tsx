import { Tooltip as Primitive } from '@base-ui/react/tooltip';
import type { ReactElement, ReactNode } from 'react';

export interface TooltipProps {
  /** The control that is explained; it must say its own name without the tip. */
  children: ReactElement;
  text: ReactNode;
  side?: 'top' | 'right' | 'bottom' | 'left';
}

/** A hint for sight only, on hover and on focus; nothing may depend on it. */
export function Tooltip({ children, text, side = 'top' }: TooltipProps) {
  return (
    <Primitive.Root>
      <Primitive.Trigger render={children} />
      <Primitive.Portal>
        <Primitive.Positioner side={side} sideOffset={6} collisionPadding={8} className="z-50">
          <Primitive.Popup className="max-w-72 rounded bg-ink px-2 py-1 text-sm text-paper">
            {text}
          </Primitive.Popup>
        </Primitive.Positioner>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
