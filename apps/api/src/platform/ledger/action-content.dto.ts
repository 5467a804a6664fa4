import { Instant, WholeNumber } from '../dto/fields.js';

/** What every action's content begins with. */
export class ActionContentDto {
  /** The version of the content's shape. */
  @WholeNumber({ min: 1, max: 1 })
  v: number;

  /** When it happened by the device's clock, ISO 8601 with its zone. */
  @Instant()
  happenedAt: string;
}
