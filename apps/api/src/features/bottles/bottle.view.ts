import { ApiProperty } from '@nestjs/swagger';
import type { BottleTotals, ChemistryDocument, Material, Role } from '@wetside/chemistry';
import { materials, roles } from '@wetside/chemistry';
import { problem } from '../../platform/errors/problem.js';
import type { BottleDetail } from './bottles.repository.js';

/** A bottle with its running totals; how it stands is reckoned from them by the rules' package. */
export class BottleView {
  @ApiProperty({ format: 'uuid' })
  id: string;

  @ApiProperty()
  code: string;

  @ApiProperty({ format: 'uuid' })
  chemistryVersionId: string;

  @ApiProperty()
  name: string;

  @ApiProperty({ enum: roles })
  role: Role;

  @ApiProperty({ enum: materials, nullable: true, type: String })
  material: Material | null;

  @ApiProperty({
    type: 'object',
    additionalProperties: true,
    description: 'BottleTotals of @wetside/chemistry',
  })
  totals: BottleTotals;

  @ApiProperty({ type: String, nullable: true, description: 'Who put it on hold.' })
  holdBy: string | null;

  @ApiProperty({ type: Number, nullable: true })
  costMinor: number | null;

  @ApiProperty({ type: String, nullable: true })
  currency: string | null;

  @ApiProperty()
  mixedBy: string;
}

export class BottlesAnswer {
  @ApiProperty({ type: BottleView, isArray: true })
  bottles: BottleView[];

  @ApiProperty({ type: 'object', additionalProperties: { type: 'object', additionalProperties: true } })
  versions: Record<string, ChemistryDocument>;

  @ApiProperty({ format: 'date' })
  today: string;
}

/** @throws Problem 'bottle-taken-back' for a bottle whose mix was voided */
export function toBottleView(row: BottleDetail): BottleView {
  if (!row.totals) throw problem('bottle-taken-back', row.code);
  return {
    id: row.id,
    code: row.code,
    chemistryVersionId: row.chemistryVersionId,
    name: row.document.name,
    role: row.document.role,
    material: row.material,
    totals: row.totals,
    holdBy: row.holdBy,
    costMinor: row.costMinor,
    currency: row.currency,
    mixedBy: row.mixedBy,
  };
}
