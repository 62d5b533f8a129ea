import { Toast } from '@base-ui/react/toast';

export const toastManager = Toast.createToastManager();

export interface ToastMessage {
  title: string;
  description?: string;
  kind?: 'note' | 'good' | 'bad';
  action?: { label: string; run: () => void };
}

/** Tells of something that has happened; a fault stays until it is dismissed. */
export function showToast({ title, description, kind = 'note', action }: ToastMessage): void {
  toastManager.add({
    title,
    description,
    type: kind,
    priority: kind === 'bad' ? 'high' : 'low',
    timeout: kind === 'bad' || action ? 0 : 5000,
    ...(action ? { actionProps: { children: action.label, onClick: action.run } } : {}),
  });
}
