import { useEffect, useState } from 'react';

/** Counts whole seconds down to 0; starts anew whenever `cause` changes. */
export function useWait(seconds: number, cause: unknown): number {
  const [passed, setPassed] = useState({ cause, seconds: 0 });
  useEffect(() => {
    if (seconds <= 0) return;
    const startedAt = Date.now();
    const timer = setInterval(() => {
      const now = Math.round((Date.now() - startedAt) / 1_000);
      setPassed({ cause, seconds: now });
      if (now >= seconds) clearInterval(timer);
    }, 1_000);
    return () => clearInterval(timer);
  }, [seconds, cause]);
  return Math.max(0, Math.ceil(seconds) - (passed.cause === cause ? passed.seconds : 0));
}
