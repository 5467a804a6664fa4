import { localDate, type LocalDate, showDate } from './dates.js';
import type { Material } from './film.js';
import { E4, roundLeftDown, roundUsedUp, showNeededVolume, showVolume } from './units.js';

const unit = (material: Material, text: string): string =>
  `${text} ${material === 'film' ? 'roll' : 'print'}${text === '1' ? '' : 's'}`;

/** '13.4 rolls', '1 print': what is left or rated, rounded down. */
export const showLeft = (rollsE4: number, material: Material): string =>
  unit(material, roundLeftDown(rollsE4));

/** The same of what is used or over, rounded up. */
export const showUsed = (rollsE4: number, material: Material): string => unit(material, roundUsedUp(rollsE4));

/** '14:30', or '14:30 on 3 Mar' when that is not today. */
export function showInstant(iso: string, zone: string, today: LocalDate): string {
  const time = new Intl.DateTimeFormat('en-GB', { timeZone: zone, timeStyle: 'short' }).format(new Date(iso));
  const day = localDate(iso, zone);
  return day === today ? time : `${time} on ${showDate(day, today)}`;
}

/** 'Spent: 26 of 24 rolls used, 2 over'. */
export function spentSentence(
  standing: { usedE4: number; ratedE4: number; tallyLeftE4: number; overE4: number },
  material: Material,
): string {
  if (standing.tallyLeftE4 > 0) return 'Spent: the last test leaves nothing';
  const used = `${roundUsedUp(standing.usedE4)} of ${showLeft(standing.ratedE4, material)} used`;
  return `Spent: ${used}${standing.overE4 > 0 ? `, ${roundUsedUp(standing.overE4)} over` : ''}`;
}

/** '500 mL. The smallest tank needs 600 mL', or 'Empty'. */
export const volumeSentence = (volumeUl: number, neededUl: number): string =>
  volumeUl === 0 ? 'Empty' : `${showVolume(volumeUl)}. The smallest tank needs ${showNeededVolume(neededUl)}`;

/** 'Owed 140 mL. 0.6 turnovers'. Owed is rounded up to the mL, turnovers up to the tenth. */
export function replenishedSentence(owedUl: number, replenishedUl: number, ratedVolumeUl: number): string {
  const turnovers = ratedVolumeUl > 0 ? roundUsedUp(Math.ceil((replenishedUl / ratedVolumeUl) * E4)) : '0';
  return `Owed ${Math.ceil(owedUl / 1_000)} mL. ${turnovers} turnovers`;
}

/** What stands at the front of a sentence about a bottle that nobody saw mixed. */
export const about = (isAbout: boolean, sentence: string): string =>
  isAbout ? `About ${sentence.charAt(0).toLowerCase()}${sentence.slice(1)}` : sentence;
