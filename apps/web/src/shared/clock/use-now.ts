import { useEffect, useState } from 'react';
import { reckonedNow } from './web-clock.js';

const LOOK_AGAIN_MS = 30_000;

/** The present instant, kept fresh while the page is looked at, so that a date passes on screen too. */
export function useNow(): string {
  const [now, setNow] = useState(reckonedNow);
  useEffect(() => {
    const look = (): void => setNow(reckonedNow());
    const timer = setInterval(look, LOOK_AGAIN_MS);
    document.addEventListener('visibilitychange', look);
    return () => {
      clearInterval(timer);
      document.removeEventListener('visibilitychange', look);
    };
  }, []);
  return now;
}
