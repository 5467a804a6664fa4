import { ROLES, type Role } from '../../platform/auth/roles.js';
import { Choice, Id, Nested, Text, WholeNumber } from '../../platform/dto/fields.js';

const MOST = Number.MAX_SAFE_INTEGER;

/** The caller's own membership. */
export class OwnMembershipView {
  @Id()
  membershipId: string;

  @Choice(ROLES)
  role: Role;

  @Text({ max: 80 })
  displayName: string;
}

export class UnitsView {
  @Choice(['C', 'F'])
  temperature: 'C' | 'F';

  @Choice(['mL', 'fl oz'])
  volume: 'mL' | 'fl oz';
}

/** When a bottle counts as low, or as near its date. */
export class ThresholdsView {
  /** Share of the rated capacity, in 1/10,000. */
  @WholeNumber({ min: 0, max: 10_000 })
  lowShareE4: number;

  /** Rolls, in 1/10,000. */
  @WholeNumber({ min: 0, max: MOST })
  lowRollsE4: number;

  @WholeNumber({ min: 0, max: 3650 })
  nearDaysMax: number;

  /** Share of the keeping time, in 1/10,000. */
  @WholeNumber({ min: 0, max: 10_000 })
  nearShareE4: number;

  /** Microlitres; null where nobody has said. */
  @WholeNumber({ min: 1, max: MOST, nullable: true })
  smallestTankUl: number | null;
}

export class DarkroomView {
  @Id()
  id: string;

  @Text({ max: 32 })
  shortName: string;

  @Text({ max: 80 })
  name: string;

  /** IANA name. */
  @Text({ max: 64 })
  zone: string;

  @Nested(() => UnitsView)
  units: UnitsView;

  /** ISO 4217. */
  @Text({ min: 3, max: 3 })
  currency: string;

  @Nested(() => ThresholdsView)
  thresholds: ThresholdsView;

  @Nested(() => OwnMembershipView)
  me: OwnMembershipView;
}
