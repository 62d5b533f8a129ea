import { Toast as Primitive } from '@base-ui/react/toast';
import { X } from 'lucide-react';
import { classNames } from './class-names';
import { IconButton } from './icon-button';
import { toastManager } from './show-toast';

const EDGE: Record<string, string> = { good: 'border-l-water', bad: 'border-l-rust' };

/** Holds the toasts of the page; stands once, in the frame. */
export function ToastArea() {
  return (
    <Primitive.Provider toastManager={toastManager} limit={4}>
      <Primitive.Portal>
        <Primitive.Viewport className="fixed inset-x-3 bottom-3 z-60 flex flex-col gap-2 sm:left-auto sm:w-96">
          <ToastList />
        </Primitive.Viewport>
      </Primitive.Portal>
    </Primitive.Provider>
  );
}

function ToastList() {
  const { toasts } = Primitive.useToastManager();
  return toasts.map((toast) => (
    <Primitive.Root
      key={toast.id}
      toast={toast}
      // it tells and asks nothing, so it is no dialog
      role={toast.priority === 'high' ? 'alert' : 'status'}
      aria-modal={undefined}
      swipeDirection="right"
      className={classNames(
        'rounded border border-l-4 border-rule bg-sheet text-ink shadow-lift transition-opacity',
        'data-ending-style:opacity-0 data-limited:hidden data-starting-style:opacity-0',
        EDGE[toast.type ?? ''] ?? 'border-l-edge',
      )}
    >
      <Primitive.Content className="flex items-start gap-3 py-2 pr-2 pl-4">
        <div className="min-w-0 flex-1 py-1">
          <Primitive.Title className="font-semibold" />
          <Primitive.Description className="mt-0.5 text-sm text-muted" />
          <Primitive.Action className="mt-1 min-h-6 text-sm font-semibold text-copper underline underline-offset-2 touch:min-h-11" />
        </div>
        <Primitive.Close render={<IconButton label="Dismiss" icon={<X aria-hidden size={16} />} />} />
      </Primitive.Content>
    </Primitive.Root>
  ));
}
