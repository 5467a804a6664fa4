import { wasteRoutes, type WasteRoute } from '@wetside/chemistry';
import { Choice, Id, Nested, Text } from '../../platform/dto/fields.js';
import { ActionContentDto } from '../../platform/ledger/action-content.dto.js';
import { EnvelopeDto } from '../../platform/ledger/envelope.dto.js';

export class HoldContentDto extends ActionContentDto {
  @Id()
  bottleId: string;

  /** Smells wrong, wrong colour, foreign drops; or, at a release, why it may be used again. */
  @Text({ max: 300 })
  reason: string;
}

export class PutHoldDto {
  @Nested(() => HoldContentDto)
  content: HoldContentDto;

  @Nested(() => EnvelopeDto)
  envelope: EnvelopeDto;
}

export class DiscardContentDto extends ActionContentDto {
  @Id()
  bottleId: string;

  @Choice(wasteRoutes)
  wasteRoute: WasteRoute;

  @Text({ min: 0, max: 500, optional: true })
  note?: string;
}

export class PutDiscardDto {
  @Nested(() => DiscardContentDto)
  content: DiscardContentDto;

  @Nested(() => EnvelopeDto)
  envelope: EnvelopeDto;
}
