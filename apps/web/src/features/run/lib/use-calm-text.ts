import { useEffect, useRef, useState } from 'react';

const CALM_MS = 5_000;

/** Follows a text that changes often, at a pace that a screen reader can keep up with. */
export function useCalmText(text: string): string {
  const [spoken, setSpoken] = useState(text);
  const newest = useRef(text);
  useEffect(() => {
    newest.current = text;
  }, [text]);
  useEffect(() => {
    const timer = setInterval(() => setSpoken(newest.current), CALM_MS);
    return () => clearInterval(timer);
  }, []);
  return spoken;
}
