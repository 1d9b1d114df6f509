import { useEffect, useState } from 'react';

/** Counts whole seconds down to 0; starts anew whenever `cause` changes. */
export function useWait(seconds: number, cause: unknown): number {
  const [left, setLeft] = useState(0);
  useEffect(() => {
    setLeft(Math.ceil(seconds));
    if (seconds <= 0) return;
    const timer = setInterval(() => setLeft((now) => Math.max(0, now - 1)), 1_000);
    return () => clearInterval(timer);
  }, [seconds, cause]);
  return left;
}
