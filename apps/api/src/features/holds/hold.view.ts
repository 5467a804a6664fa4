import { ApiProperty } from '@nestjs/swagger';
import { ActionView } from '../../platform/ledger/action.view.js';
import { BottleView } from '../bottles/bottle.view.js';

export class BottleActionAnswer {
  @ApiProperty({ type: ActionView })
  action: ActionView;

  @ApiProperty({ type: BottleView })
  bottle: BottleView;
}
