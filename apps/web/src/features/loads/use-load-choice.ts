import { useState } from 'react';
import type { FilmLine } from '../../shared/api/types.js';
import type { Standing } from '../bottles/standing.js';
import { noPicks, reportedAs, toggled } from './bath-picks.js';
import { rememberedChoice } from './remembered-choice.js';
import type { OpenLoad } from './use-load-sheet.js';

/** What the person has chosen on the sheet so far. */
export function useLoadChoice(membershipId: string, load: OpenLoad) {
  const [film, setFilm] = useState<FilmLine>(() => rememberedChoice(membershipId));
  const [picks, setPicks] = useState(() => noPicks(load.reported ? load.bottleIds : []));
  return {
    film,
    picks,
    setFilm,
    setCount: (count: number): void => setFilm((now) => ({ ...now, count })),
    toggle: (bath: Standing, isIn: boolean): void => setPicks((now) => toggled(now, bath, isIn)),
    report: (bath: Standing): void => setPicks((now) => reportedAs(now, bath)),
  };
}
