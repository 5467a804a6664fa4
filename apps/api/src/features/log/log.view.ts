import { ApiProperty } from '@nestjs/swagger';
import { WholeNumber, Text } from '../../platform/dto/fields.js';
import { ActionView } from '../../platform/ledger/action.view.js';

/** One line of the log. */
export class LogEntryView {
  @ApiProperty({ type: ActionView })
  action: ActionView;

  @ApiProperty({ description: 'What was done, without who and when: "2 rolls of 135, conventional".' })
  sentence: string;

  @ApiProperty({ type: String, isArray: true, description: 'The bottles it touched, by their codes.' })
  codes: string[];

  @ApiProperty({ type: String, isArray: true, description: 'What stood against it when it was recorded.' })
  flags: string[];

  @ApiProperty({ format: 'uuid', required: false, description: 'On a void: what it took back.' })
  voidsActionId?: string;
}

export class LogAnswer {
  @ApiProperty({ type: LogEntryView, isArray: true })
  entries: LogEntryView[];

  @ApiProperty({ type: String, nullable: true })
  nextCursor: string | null;
}

export class LogQuery {
  /** Where the page before ended. */
  @Text({ max: 200, trim: false, optional: true })
  cursor?: string;

  @WholeNumber({ min: 1, max: 100, optional: true, query: true })
  limit?: number;
}
