import { Dialog as Primitive } from '@base-ui/react/dialog';
import { X } from 'lucide-react';
import type { ReactNode } from 'react';
import { classNames } from './class-names';
import { IconButton } from './icon-button';

export interface DialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: ReactNode;
  description?: ReactNode;
  children?: ReactNode;
  /** Buttons, the main one last. */
  actions?: ReactNode;
  width?: 'narrow' | 'regular' | 'wide';
}

const WIDTH = { narrow: 'sm:max-w-sm', regular: 'sm:max-w-lg', wide: 'sm:max-w-4xl' } as const;

/** A sheet over the page; on a telephone it rises from the lower edge. */
export function Dialog(props: DialogProps) {
  const { open, onOpenChange, title, description, children, actions, width = 'regular' } = props;
  return (
    <Primitive.Root open={open} onOpenChange={onOpenChange}>
      <Primitive.Portal>
        <Primitive.Backdrop className="fixed inset-0 z-40 bg-shade transition-opacity data-ending-style:opacity-0 data-starting-style:opacity-0" />
        <Primitive.Popup
          className={classNames(
            'fixed inset-x-0 bottom-0 z-50 flex max-h-[calc(100dvh-1.5rem)] w-full flex-col rounded border border-rule bg-sheet text-ink shadow-lift',
            'sm:inset-auto sm:top-[12vh] sm:left-1/2 sm:max-h-[80vh] sm:-translate-x-1/2',
            'transition-opacity duration-100 data-ending-style:opacity-0 data-starting-style:opacity-0',
            WIDTH[width],
          )}
        >
          <header className="flex items-start gap-4 border-b border-rule px-5 py-3">
            <div className="min-w-0 flex-1 py-1">
              <Primitive.Title className="text-lg font-semibold">{title}</Primitive.Title>
              {description ? (
                <Primitive.Description className="mt-1 text-muted">{description}</Primitive.Description>
              ) : null}
            </div>
            <Primitive.Close render={<IconButton label="Close" icon={<X aria-hidden size={18} />} />} />
          </header>
          {children ? <div className="min-h-0 flex-1 overflow-y-auto px-5 py-4">{children}</div> : null}
          {actions ? (
            <footer className="flex flex-wrap justify-end gap-2 border-t border-rule px-5 py-3">
              {actions}
            </footer>
          ) : null}
        </Primitive.Popup>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
