import { useLayoutEffect, useRef, useState } from 'react';

export interface BoxSize {
  width: number;
  height: number;
}

/** Inner size of an element, px, kept up to date; zero before it is first measured. */
export function useBoxSize<Box extends HTMLElement>() {
  const ref = useRef<Box>(null);
  const [size, setSize] = useState<BoxSize>({ width: 0, height: 0 });
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return undefined;
    const measure = () => {
      const next = { width: Math.floor(element.clientWidth), height: Math.floor(element.clientHeight) };
      setSize((last) => (last.width === next.width && last.height === next.height ? last : next));
    };
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return { ref, size };
}
