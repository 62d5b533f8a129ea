import { Popover as Primitive } from '@base-ui/react/popover';
import type { ReactElement, ReactNode } from 'react';
import { classNames } from './class-names';
import { POPUP_CLASS } from './popup-class';

export interface PopoverProps {
  trigger: ReactElement;
  title?: ReactNode;
  children: ReactNode;
  side?: 'top' | 'right' | 'bottom' | 'left';
  className?: string;
}

/** A note or a small form beside its button; opens by click or key, closes by Escape. */
export function Popover({ trigger, title, children, side = 'bottom', className }: PopoverProps) {
  return (
    <Primitive.Root>
      <Primitive.Trigger render={trigger} />
      <Primitive.Portal>
        <Primitive.Positioner side={side} sideOffset={6} collisionPadding={8} className="z-50">
          <Primitive.Popup
            className={classNames(POPUP_CLASS, 'max-w-[min(24rem,calc(100vw-1rem))] px-4 py-3', className)}
          >
            {title ? <Primitive.Title className="mb-1.5 font-semibold">{title}</Primitive.Title> : null}
            {children}
          </Primitive.Popup>
        </Primitive.Positioner>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
