import type { ReactNode } from 'react';
import { Button } from './button';
import { Dialog } from './dialog';

export interface ConfirmDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: ReactNode;
  /** What will happen, and whether it can be undone. */
  description: ReactNode;
  /** The verb of the deed, as "Remove member". */
  confirmLabel: string;
  onConfirm: () => void;
  danger?: boolean;
  working?: boolean;
  children?: ReactNode;
}

export function ConfirmDialog(props: ConfirmDialogProps) {
  const { open, onOpenChange, title, description, confirmLabel, onConfirm, danger, working, children } =
    props;
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title={title}
      description={description}
      width="narrow"
      actions={
        <>
          <Button onClick={() => onOpenChange(false)}>Cancel</Button>
          <Button kind={danger ? 'danger' : 'main'} loading={working ?? false} onClick={onConfirm}>
            {confirmLabel}
          </Button>
        </>
      }
    >
      {children}
    </Dialog>
  );
}
