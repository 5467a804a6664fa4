import { ApiProperty } from '@nestjs/swagger';
import { Choice, Id, ListOf, LocalDateField, Nested } from '../../platform/dto/fields.js';
import { ActionContentDto } from '../../platform/ledger/action-content.dto.js';
import { ActionView } from '../../platform/ledger/action.view.js';
import { EnvelopeDto } from '../../platform/ledger/envelope.dto.js';

export class SupplierPackView {
  @ApiProperty({ format: 'uuid' })
  supplierPackId: string;

  @ApiProperty({ format: 'uuid' })
  packId: string;

  @ApiProperty()
  packName: string;

  @ApiProperty({ description: 'What the supplier calls it.' })
  supplierName: string;

  @ApiProperty({ type: Number, nullable: true })
  priceMinor: number | null;

  @ApiProperty({ type: String, format: 'date', nullable: true })
  outUntil: string | null;
}

export class SupplierView {
  @ApiProperty({ format: 'uuid' })
  id: string;

  @ApiProperty()
  name: string;

  @ApiProperty({ format: 'email' })
  email: string;

  @ApiProperty()
  currency: string;

  @ApiProperty({ type: Number, nullable: true })
  minimumMinor: number | null;

  @ApiProperty({ type: Number, nullable: true })
  leadDays: number | null;

  @ApiProperty({ type: SupplierPackView, isArray: true })
  packs: SupplierPackView[];
}

export class SuppliersAnswer {
  @ApiProperty({ type: SupplierView, isArray: true })
  suppliers: SupplierView[];
}

export class SettingDto {
  @Choice(['outUntil'])
  field: 'outUntil';

  @LocalDateField({ nullable: true })
  value: string | null;
}

export class SettingChangeContent extends ActionContentDto {
  @Choice(['supplier-pack'])
  subject: 'supplier-pack';

  @Id()
  subjectId: string;

  @ListOf(() => SettingDto, { min: 1, max: 1 })
  changes: SettingDto[];
}

export class PutSettingChange {
  @Nested(() => SettingChangeContent)
  content: SettingChangeContent;

  @Nested(() => EnvelopeDto)
  envelope: EnvelopeDto;
}

export class SettingChangeAnswer {
  @ApiProperty({ type: ActionView })
  action: ActionView;
}
