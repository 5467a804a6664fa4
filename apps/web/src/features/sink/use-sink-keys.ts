import { useEffect } from 'react';

const isTyping = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement && target.closest('input, textarea, select, [role=dialog]') !== null;

/** On a desk: t opens the load sheet, u undoes what was just done. */
export function useSinkKeys(open: () => void, undo: () => void): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent): void => {
      if (event.ctrlKey || event.metaKey || event.altKey || isTyping(event.target)) return;
      if (event.key !== 't' && event.key !== 'u') return;
      event.preventDefault();
      if (event.key === 't') open();
      else undo();
    };
    document.addEventListener('keydown', onKey);
    return () => document.removeEventListener('keydown', onKey);
  });
}
