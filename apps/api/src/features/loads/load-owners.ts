import type { guests } from '@wetside/db';
import { invalid } from '../../platform/errors/problem.js';
import type { Recording } from '../../platform/ledger/recording.js';
import type { FilmDto } from './load.dto.js';
import type { NewFilm } from './loads.repository.js';

/** Guests that the load names, each once. */
export function guestRows(recording: Recording, film: readonly FilmDto[]): (typeof guests.$inferInsert)[] {
  const named = new Map(
    film.flatMap(({ owner }) => (owner?.guest ? [[owner.guest.id, owner.guest] as const] : [])),
  );
  return [...named.values()].map(({ id, name, reach }) => ({
    darkroomId: recording.darkroomId,
    id,
    name,
    reach,
  }));
}

/** The film of a load as rows: the caller's own where nobody else is named. */
export function filmRows(recording: Recording, film: readonly FilmDto[]): NewFilm[] {
  return film.map(({ owner, ...one }, ordinal) => {
    if (owner?.guest && owner.membershipId) {
      throw invalid([
        { field: `content.film.${ordinal}.owner`, message: 'Name a member or a guest, not both.' },
      ]);
    }
    return {
      darkroomId: recording.darkroomId,
      actionId: recording.id,
      ordinal,
      format: one.format,
      widthMm: one.widthMm ?? null,
      heightMm: one.heightMm ?? null,
      count: one.count,
      filmClass: one.filmClass,
      ownerGuestId: owner?.guest?.id ?? null,
      ownerMembershipId: owner?.guest ? null : (owner?.membershipId ?? recording.me.membershipId),
    };
  });
}
