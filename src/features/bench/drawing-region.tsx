import { useEffect, useEffectEvent, useRef, type ReactNode } from 'react';

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

/** Single keys count only while the focus is in here (WCAG 2.1.4). */
export function DrawingRegion({ onFit, onUndo, onRedo, className, children }: DrawingRegionProps) {
  const region = useRef<HTMLDivElement>(null);
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
    element?.addEventListener('keydown', hear);
    return () => element?.removeEventListener('keydown', hear);
  }, []);
  return (
    <div ref={region} className={className}>
      {children}
    </div>
  );
}
