import { useEffect, useRef } from 'react';

/** Lets a frame be reached and scrolled by key, but only while its content overflows it (WCAG 2.1.1). */
export function useScrollFrame<Frame extends HTMLElement>() {
  const frame = useRef<Frame>(null);
  useEffect(() => {
    const element = frame.current;
    if (!element) return undefined;
    const mark = () => {
      const scrolls =
        element.scrollWidth > element.clientWidth || element.scrollHeight > element.clientHeight;
      if (scrolls) element.tabIndex = 0;
      else element.removeAttribute('tabindex');
    };
    const observer = new ResizeObserver(mark);
    observer.observe(element);
    if (element.firstElementChild) observer.observe(element.firstElementChild);
    return () => observer.disconnect();
  }, []);
  return frame;
}
