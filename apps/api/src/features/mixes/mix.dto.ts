import { ApiProperty } from '@nestjs/swagger';
import { materials, type ChemistryDocument, type Material } from '@wetside/chemistry';
import { containerKinds, containerMaterials } from '@wetside/db';
import { Type } from 'class-transformer';
import { IsObject, ValidateNested } from 'class-validator';
import { Choice, Id, ID_SCHEMA, ListOfIds, Nested, Text, WholeNumber } from '../../platform/dto/fields.js';
import { ActionContentDto } from '../../platform/ledger/action-content.dto.js';
import { ActionView } from '../../platform/ledger/action.view.js';
import { EnvelopeDto } from '../../platform/ledger/envelope.dto.js';
import { BottleView } from '../bottles/bottle.view.js';

/** 1 mL to 1,000 L. */
const LEAST_UL = 1_000;
const MOST_UL = 1_000_000_000;

export class ContainerDto {
  @WholeNumber({ min: LEAST_UL, max: MOST_UL })
  sizeUl: number;

  @Choice(containerKinds)
  kind: (typeof containerKinds)[number];

  @Choice(containerMaterials, { optional: true })
  material?: (typeof containerMaterials)[number];
}

const fromShape = (kind: string, fields: Record<string, object>) => ({
  type: 'object',
  required: ['kind', ...Object.keys(fields)],
  properties: { kind: { type: 'string', enum: [kind] }, ...fields },
  additionalProperties: false,
});

/** What each kind of source needs beside its kind, for the OpenAPI document. */
const FROM_SHAPES = [
  fromShape('lot', { lotId: ID_SCHEMA }),
  fromShape('opened', { openedPackIds: { type: 'array', items: ID_SCHEMA, minItems: 1, maxItems: 8 } }),
  fromShape('stock', { bottleId: ID_SCHEMA }),
  fromShape('hand', {}),
];

export class MixFromDto {
  @Choice(['lot', 'opened', 'stock', 'hand'])
  kind: 'lot' | 'opened' | 'stock' | 'hand';

  @Id({ onlyWith: { field: 'kind', value: 'lot' } })
  lotId?: string;

  /** One opened pack for each part. */
  @ListOfIds({ min: 1, max: 8, onlyWith: { field: 'kind', value: 'opened' } })
  openedPackIds?: string[];

  /** The bottle of stock solution. */
  @Id({ onlyWith: { field: 'kind', value: 'stock' } })
  bottleId?: string;
}

export class MixContentDto extends ActionContentDto {
  @Id()
  bottleId: string;

  @Id()
  chemistryVersionId: string;

  @WholeNumber({ min: LEAST_UL, max: MOST_UL })
  volumeUl: number;

  @Nested(() => ContainerDto)
  container: ContainerDto;

  @Choice(materials, { nullable: true })
  material: Material | null;

  @ApiProperty({ oneOf: FROM_SHAPES })
  @Type(() => MixFromDto)
  @IsObject({ message: 'Fill this part in.' })
  @ValidateNested({ message: 'Fill this part in.' })
  from: MixFromDto;

  @Text({ min: 0, max: 500, optional: true })
  note?: string;
}

export class PutMixDto {
  @Nested(() => MixContentDto)
  content: MixContentDto;

  @Nested(() => EnvelopeDto)
  envelope: EnvelopeDto;
}

export class MixAnswer {
  @ApiProperty({ type: ActionView })
  action: ActionView;

  @ApiProperty({ type: BottleView })
  bottle: BottleView;

  @ApiProperty({ type: 'object', additionalProperties: true })
  document: ChemistryDocument;
}
