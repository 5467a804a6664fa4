import { ApiProperty } from '@nestjs/swagger';
import {
  filmClasses,
  materials,
  namedFormats,
  sheetFormat,
  type FilmClass,
  type Material,
  type StepFlag,
} from '@wetside/chemistry';
import { loadFlags, type LoadFlag } from '@wetside/db';
import { BottleView } from '../bottles/bottle.view.js';
import { ActionView } from '../../platform/ledger/action.view.js';

export class LoadFilmView {
  @ApiProperty({ enum: [...namedFormats, sheetFormat] })
  format: string;

  @ApiProperty({ type: Number, nullable: true })
  widthMm: number | null;

  @ApiProperty({ type: Number, nullable: true })
  heightMm: number | null;

  @ApiProperty()
  count: number;

  @ApiProperty({ enum: filmClasses })
  filmClass: FilmClass;

  @ApiProperty()
  ownerName: string;
}

export class LoadStepView {
  @ApiProperty({ format: 'uuid' })
  bottleId: string;

  @ApiProperty()
  code: string;

  @ApiProperty({ enum: materials })
  material: Material;

  @ApiProperty()
  nominalE4: number;

  @ApiProperty()
  countedE4: number;

  @ApiProperty()
  takenUl: number;

  @ApiProperty({ type: String, isArray: true })
  flags: StepFlag[];
}

export class LoadView {
  @ApiProperty({ enum: loadFlags, isArray: true })
  flags: LoadFlag[];

  @ApiProperty({ type: String, nullable: true })
  note: string | null;

  @ApiProperty({ type: LoadFilmView, isArray: true })
  film: LoadFilmView[];

  @ApiProperty({ type: LoadStepView, isArray: true })
  steps: LoadStepView[];
}

export class LoadAnswer {
  @ApiProperty({ type: ActionView })
  action: ActionView;

  @ApiProperty({ type: LoadView })
  load: LoadView;

  @ApiProperty({ type: BottleView, isArray: true })
  bottles: BottleView[];
}

export class ActionAnswer {
  @ApiProperty({ type: ActionView })
  action: ActionView;
}
