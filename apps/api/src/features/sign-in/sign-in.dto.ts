import { ListOf, MailAddress, Choice, Id, Instant, Nested, Text } from '../../platform/dto/fields.js';
import { PASSPHRASE_MAX } from '../../platform/auth/passphrase-rules.js';
import { ROLES, type Role } from '../../platform/auth/roles.js';

export class SignInRequest {
  @MailAddress()
  email: string;

  @Text({ max: PASSPHRASE_MAX, trim: false })
  passphrase: string;
}

export class PersonView {
  @Id()
  id: string;

  @Text({ max: 80 })
  name: string;
}

/** A darkroom the person belongs to, as the way in shows it. */
export class OwnDarkroomView {
  @Id()
  id: string;

  @Text({ max: 32 })
  shortName: string;

  @Text({ max: 80 })
  name: string;

  @Choice(ROLES)
  role: Role;
}

export class SignedInView {
  @Nested(() => PersonView)
  person: PersonView;

  @ListOf(() => OwnDarkroomView, { max: 1000 })
  darkrooms: OwnDarkroomView[];
}

export class MeView extends SignedInView {
  @Instant()
  now: string;
}
