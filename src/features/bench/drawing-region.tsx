import { useEffect, useEffectEvent, useRef, type ReactNode } from 'react';
import { classNames } from '../../ui/class-names';

export interface DrawingRegionProps {
  onFit: (() => void) | null;
  onUndo: () => void;
  onRedo: () => void;
  className?: string;
  children: ReactNode;
}

/** Whether a key typed here writes something, and so must not be taken for a command. */
const isWriting = (target: EventTarget | null): boolean =>
  (target instanceof HTMLInputElement && !['range', 'checkbox', 'radio'].includes(target.type)) ||
  target instanceof HTMLTextAreaElement ||
  target instanceof HTMLSelectElement;

/** Whether the focus is where a person just put it to write or to choose, and must not be taken away. */
const isBusy = (element: Element | null): boolean =>
  isWriting(element) || Boolean(element?.closest('[role="dialog"], [role="menu"]'));

/**
 * Single keys count only while the focus is in here (WCAG 2.1.4). So the region takes the focus on arrival, and takes it back
 * when the control that had it goes or greys out.
 */
export function DrawingRegion({ onFit, onUndo, onRedo, className, children }: DrawingRegionProps) {
  const region = useRef<HTMLElement>(null);
  const hasFocus = useRef(false);
  const onKey = useEffectEvent((event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey || isWriting(event.target)) return;
    const key = event.key.toLowerCase();
    if (key === 'f' && onFit) onFit();
    else if (key === 'z' && event.shiftKey) onRedo();
    else if (key === 'z') onUndo();
    else return;
    event.preventDefault();
  });
  useEffect(() => {
    const element = region.current;
    const hear = (event: KeyboardEvent) => onKey(event);
    const follow = (event: Event) => {
      hasFocus.current = event.target instanceof Node && (element?.contains(event.target) ?? false);
    };
    element?.addEventListener('keydown', hear);
    document.addEventListener('focusin', follow);
    document.addEventListener('pointerdown', follow);
    if (!isBusy(document.activeElement)) element?.focus({ preventScroll: true });
    return () => {
      element?.removeEventListener('keydown', hear);
      document.removeEventListener('focusin', follow);
      document.removeEventListener('pointerdown', follow);
    };
  }, []);
  useEffect(() => {
    const active = document.activeElement;
    const isLost = active === null || active === document.body || active.matches(':disabled');
    if (hasFocus.current && isLost) region.current?.focus({ preventScroll: true });
  });
  return (
    <section
      ref={region}
      aria-label="Ground and curve"
      aria-keyshortcuts={onFit ? 'F Z Shift+Z' : 'Z Shift+Z'}
      tabIndex={-1}
      className={classNames('outline-none', className)}
    >
      {children}
    </section>
  );
}
