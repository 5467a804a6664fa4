import {
  filmClasses,
  materials,
  namedFormats,
  sheetFormat,
  type FilmClass,
  type Material,
  type NamedFormat,
} from '@wetside/chemistry';
import { Choice, Flag, Id, ListOf, ListOfIds, Nested, Text, WholeNumber } from '../../platform/dto/fields.js';
import { ActionContentDto } from '../../platform/ledger/action-content.dto.js';
import { EnvelopeDto } from '../../platform/ledger/envelope.dto.js';

export class GuestDto {
  @Id()
  id: string;

  @Text({ max: 120 })
  name: string;

  /** A mail address, a telephone number, a street: how to find them when a bath turns out weak. */
  @Text({ max: 200 })
  reach: string;
}

/** Whose film it is; left out: the caller's own. */
export class OwnerDto {
  @Id({ optional: true })
  membershipId?: string;

  @Nested(() => GuestDto, { optional: true })
  guest?: GuestDto;
}

export class FilmDto {
  @Choice([...namedFormats, sheetFormat])
  format: NamedFormat | typeof sheetFormat;

  @WholeNumber({ min: 1, max: 2000, optional: true })
  widthMm?: number;

  @WholeNumber({ min: 1, max: 2000, optional: true })
  heightMm?: number;

  @WholeNumber({ min: 1, max: 99 })
  count: number;

  @Choice(filmClasses)
  filmClass: FilmClass;

  @Nested(() => OwnerDto, { optional: true })
  owner?: OwnerDto;
}

export class LoadContentDto extends ActionContentDto {
  /** The very bottles that it went through; the server never puts another in their place. */
  @ListOfIds({ min: 1, max: 12 })
  bottleIds: string[];

  @Choice(materials)
  material: Material;

  @ListOf(() => FilmDto, { min: 1, max: 8 })
  film: FilmDto[];

  @Id({ optional: true, nullable: true })
  lineVersionId?: string | null;

  /** Said by the person of a load that has already gone through a bottle which it should not have. */
  @Flag({ optional: true })
  reported?: boolean;

  @Text({ min: 0, max: 500, optional: true })
  note?: string;
}

export class PutLoadDto {
  @Nested(() => LoadContentDto)
  content: LoadContentDto;

  @Nested(() => EnvelopeDto)
  envelope: EnvelopeDto;
}

export class DecisionContentDto extends ActionContentDto {
  @Id()
  loadActionId: string;

  @Choice(['accept'])
  decision: 'accept';

  @Text({ max: 500 })
  reason: string;
}

export class PutDecisionDto {
  @Nested(() => DecisionContentDto)
  content: DecisionContentDto;

  @Nested(() => EnvelopeDto)
  envelope: EnvelopeDto;
}
