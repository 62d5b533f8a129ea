import { useCallback, useEffect, useState, type RefObject } from 'react';

export interface RowWindow {
  /** First row that is drawn, and the one after the last. */
  start: number;
  end: number;
  rowHeight: number;
  scrollToRow: (row: number) => void;
}

const OVERSCAN = 12;
const HEAD_PX = 44;

/** The rows to draw of a long list whose rows are all of one height. */
export function rowRange(
  count: number,
  rowHeight: number,
  view: { scrollTop: number; height: number },
): { start: number; end: number } {
  const first = Math.floor(view.scrollTop / rowHeight);
  const visible = Math.ceil(view.height / rowHeight);
  return {
    start: Math.max(0, Math.min(first - OVERSCAN, count)),
    end: Math.min(count, first + visible + OVERSCAN),
  };
}

/** Follows the scrolling of `frame`; `rowHeight` must be what the rows really have. */
export function useRowWindow(
  frame: RefObject<HTMLElement | null>,
  count: number,
  rowHeight: number,
): RowWindow {
  const [view, setView] = useState({ scrollTop: 0, height: 800 });
  useEffect(() => {
    const element = frame.current;
    if (!element) return undefined;
    const look = () => setView({ scrollTop: element.scrollTop, height: element.clientHeight });
    const observer = new ResizeObserver(look);
    observer.observe(element);
    element.addEventListener('scroll', look, { passive: true });
    return () => {
      observer.disconnect();
      element.removeEventListener('scroll', look);
    };
  }, [frame]);
  const scrollToRow = useCallback(
    (row: number) => {
      const element = frame.current;
      if (!element) return;
      const top = row * rowHeight;
      const lowest = element.scrollTop + element.clientHeight - HEAD_PX - rowHeight;
      if (top < element.scrollTop) element.scrollTo({ top });
      else if (top > lowest) element.scrollTo({ top: top - element.clientHeight + HEAD_PX + rowHeight });
    },
    [frame, rowHeight],
  );
  return { ...rowRange(count, rowHeight, view), rowHeight, scrollToRow };
}
