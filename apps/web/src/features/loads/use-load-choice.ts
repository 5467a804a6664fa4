import { useState } from 'react';
import type { FilmLine } from '../../shared/api/types.js';
import type { Standing } from '../bottles/standing.js';
import { rememberedChoice } from './remembered-choice.js';
import type { OpenLoad } from './use-load-sheet.js';

const withOut = (set: ReadonlySet<string>, id: string): Set<string> => {
  const next = new Set(set);
  if (!next.delete(id)) next.add(id);
  return next;
};

/** What the person has chosen on the sheet so far. */
export function useLoadChoice(membershipId: string, load: OpenLoad) {
  const [film, setFilm] = useState<FilmLine>(() => ({ ...rememberedChoice(membershipId), count: 1 }));
  const [leftOut, setLeftOut] = useState<ReadonlySet<string>>(new Set());
  const [reported, setReported] = useState<ReadonlySet<string>>(
    () => new Set(load.reported ? load.bottleIds : []),
  );
  const isIn = ({ bottle, assessment }: Standing): boolean =>
    !leftOut.has(bottle.id) && (!assessment.closed || reported.has(bottle.id));
  return {
    film,
    leftOut,
    reported,
    isIn,
    setFilm,
    setCount: (count: number): void => setFilm((now) => ({ ...now, count })),
    /** A reported bottle goes back to closed; any other is left out or taken in again. */
    toggle: (id: string): void =>
      reported.has(id) ? setReported((now) => withOut(now, id)) : setLeftOut((now) => withOut(now, id)),
    report: (id: string): void => {
      setLeftOut((now) => new Set([...now].filter((one) => one !== id)));
      setReported((now) => new Set([...now, id]));
    },
  };
}
