import { roundLeftDown, showVolume } from '@wetside/chemistry';
import type { FilmLine } from '../../shared/api/types.js';
import { countOf } from '../../shared/formats/amounts.js';
import { stateWord } from '../../shared/ui/state-mark.js';
import { isEssential } from '../bottles/line-order.js';
import type { Standing } from '../bottles/standing.js';
import { isOpen, nextAfter, oneOfEachRole } from './one-a-role.js';

/** The load that the next bottles are reckoned for: whoever comes to the sink puts through a roll at least. */
const oneRoll: FilmLine = { format: '135-36', count: 1, filmClass: 'conventional' };

/** '13 rolls more. FX-01 gives out first. Then FX-02.', or 'Not today. FX-01 is past its date.' */
export function verdictWords(baths: readonly Standing[]): string | null {
  const open = baths.filter(isOpen);
  const roles = new Set(open.map(({ bottle }) => bottle.role));
  const stops = baths.find(({ bottle }) => isEssential(bottle.role) && !roles.has(bottle.role));
  if (stops) return `Not today. ${stops.bottle.code} is ${stateWord(stops.assessment.verdict)}.`;
  const used = oneOfEachRole(open, oneRoll);
  const needed = used.filter(({ document }) => !document.cheapToRenew);
  const known = (needed.length > 0 ? needed : used).flatMap((standing) => {
    const leftE4 = standing.assessment.leftE4.film;
    return typeof leftE4 === 'number' ? [{ standing, leftE4 }] : [];
  });
  const [least] = known.sort((a, b) => a.leftE4 - b.leftE4);
  const renew = renewFirst(baths);
  if (!least) return renew.length > 0 ? renew.join(' ') : null;
  const next = nextAfter(least.standing, open, oneRoll);
  const words = `${countOf(roundLeftDown(least.leftE4), 'roll')} more. ${least.standing.bottle.code} gives out first.`;
  return [words, ...(next ? [`Then ${next.bottle.code}.`] : []), ...renew].join(' ');
}

/** A bath that is cheap to renew never closes the line; that it is finished is said, and why. */
function renewFirst(baths: readonly Standing[]): string[] {
  const open = new Set(baths.filter(isOpen).map(({ bottle }) => bottle.role));
  const shut = baths.filter(({ bottle, document }) => document.cheapToRenew && !open.has(bottle.role));
  // Of several of one role the newest is named: its place is the one to fill.
  const newest = new Map(shut.map((standing) => [standing.bottle.role, standing]));
  return [...newest.values()].map(({ bottle, assessment }) => {
    const much = showVolume(bottle.totals.container.sizeUl);
    return `Mix ${much} of ${roleWords(bottle.role)} first: ${bottle.code} is ${stateWord(assessment.verdict)}.`;
  });
}

/** 'stop bath', 'wetting agent'. */
const roleWords = (role: string): string => role.replaceAll('-', ' ');
