import { useDeferredValue, useEffect, useState } from 'react';

/** `value` a moment later: as soon as there is time, or, with a delay, once it has stayed the same for that long. */
export function useSettled<T>(value: T, delayMs: number): T {
  const deferred = useDeferredValue(value);
  const [rested, setRested] = useState(value);
  useEffect(() => {
    if (delayMs === 0) return undefined;
    const timer = setTimeout(() => setRested(value), delayMs);
    return () => clearTimeout(timer);
  }, [value, delayMs]);
  return delayMs === 0 ? deferred : rested;
}
