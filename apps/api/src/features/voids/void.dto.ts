import { ApiProperty } from '@nestjs/swagger';
import { Id, Nested, Text } from '../../platform/dto/fields.js';
import { ActionContentDto } from '../../platform/ledger/action-content.dto.js';
import { ActionView } from '../../platform/ledger/action.view.js';
import { EnvelopeDto } from '../../platform/ledger/envelope.dto.js';
import { BottleView } from '../bottles/bottle.view.js';

export class VoidContentDto extends ActionContentDto {
  @Id()
  voidedActionId: string;

  @Text({ min: 0, max: 300, optional: true })
  reason?: string;
}

export class PutVoidDto {
  @Nested(() => VoidContentDto)
  content: VoidContentDto;

  @Nested(() => EnvelopeDto)
  envelope: EnvelopeDto;
}

export class VoidAnswer {
  @ApiProperty({ type: ActionView })
  action: ActionView;

  @ApiProperty({ type: ActionView })
  voided: ActionView;

  @ApiProperty({ type: BottleView, isArray: true })
  bottles: BottleView[];
}
