import { ApiProperty } from '@nestjs/swagger';
import type { ChemistryDocument } from '@wetside/chemistry';
import { packForms, type PackForm } from '@wetside/db';

export class MadeFromView {
  @ApiProperty({ format: 'uuid' })
  packId: string;

  @ApiProperty()
  packName: string;

  @ApiProperty({ enum: packForms })
  form: PackForm;

  @ApiProperty({ description: 'What one whole pack makes, in microlitres.' })
  volumeUl: number;

  @ApiProperty({ description: 'A powder packet is mixed whole.' })
  wholeOnly: boolean;
}

export class ChemistryView {
  @ApiProperty({ format: 'uuid' })
  id: string;

  @ApiProperty({ format: 'uuid' })
  versionId: string;

  @ApiProperty()
  number: number;

  @ApiProperty({
    type: 'object',
    additionalProperties: true,
    description: 'ChemistryDocument of @wetside/chemistry',
  })
  document: ChemistryDocument;

  @ApiProperty({ description: 'The code that its next bottle gets.' })
  nextCode: string;

  @ApiProperty({ type: MadeFromView, isArray: true })
  from: MadeFromView[];
}

export class ChemistriesAnswer {
  @ApiProperty({ type: ChemistryView, isArray: true })
  chemistries: ChemistryView[];
}
