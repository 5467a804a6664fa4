import { ApiProperty } from '@nestjs/swagger';
import { packForms, type PackForm } from '@wetside/db';

export class AdviceView {
  @ApiProperty()
  due: boolean;

  @ApiProperty({ description: 'Packs to order, 0 when nothing is due.' })
  quantity: number;

  @ApiProperty()
  reason: string;
}

export class PackPartView {
  @ApiProperty({ format: 'uuid' })
  id: string;

  @ApiProperty()
  name: string;

  @ApiProperty({ type: Number, nullable: true })
  sizeUl: number | null;

  @ApiProperty({ type: Number, nullable: true })
  sizeMg: number | null;
}

export class MakesView {
  @ApiProperty({ format: 'uuid' })
  chemistryId: string;

  @ApiProperty()
  chemistryName: string;

  @ApiProperty({ description: 'Microlitres from one whole pack.' })
  volumeUl: number;

  @ApiProperty({ description: 'A powder packet is mixed whole.' })
  wholeOnly: boolean;
}

export class OpenedPackView {
  @ApiProperty({ format: 'uuid' })
  id: string;

  @ApiProperty({ format: 'uuid' })
  partId: string;

  @ApiProperty()
  partName: string;

  @ApiProperty({ format: 'date' })
  openedOn: string;

  @ApiProperty({ type: Number, nullable: true })
  leftUl: number | null;

  @ApiProperty({ type: Number, nullable: true })
  leftMg: number | null;
}

export class LotView {
  @ApiProperty({ format: 'uuid' })
  id: string;

  @ApiProperty()
  lotNumber: string;

  @ApiProperty({ type: String, format: 'date', nullable: true })
  expiresOn: string | null;

  @ApiProperty()
  expiryIsGuess: boolean;

  @ApiProperty()
  unopened: number;

  @ApiProperty({ type: OpenedPackView, isArray: true })
  opened: OpenedPackView[];
}

export class SoldByView {
  @ApiProperty({ format: 'uuid' })
  supplierPackId: string;

  @ApiProperty({ format: 'uuid' })
  supplierId: string;

  @ApiProperty()
  supplierName: string;

  @ApiProperty({ type: Number, nullable: true })
  priceMinor: number | null;

  @ApiProperty()
  currency: string;

  @ApiProperty({ type: String, format: 'date', nullable: true })
  outUntil: string | null;
}

/** What chemistry is bought in, with all of it that is here or on its way. */
export class PackView {
  @ApiProperty({ format: 'uuid' })
  id: string;

  @ApiProperty()
  name: string;

  @ApiProperty({ enum: packForms })
  form: PackForm;

  @ApiProperty({ type: Number, nullable: true })
  reorderPoint: number | null;

  @ApiProperty({ type: Number, nullable: true })
  reorderUpTo: number | null;

  @ApiProperty()
  unopened: number;

  @ApiProperty()
  onOrder: number;

  @ApiProperty({ type: AdviceView })
  advice: AdviceView;

  @ApiProperty({ type: String, format: 'date', nullable: true })
  firstExpiry: string | null;

  @ApiProperty({ type: PackPartView, isArray: true })
  parts: PackPartView[];

  @ApiProperty({ type: MakesView, isArray: true })
  makes: MakesView[];

  @ApiProperty({ type: LotView, isArray: true })
  lots: LotView[];

  @ApiProperty({ type: SoldByView, isArray: true })
  soldBy: SoldByView[];
}

export class ShelfView {
  @ApiProperty({ type: PackView, isArray: true })
  packs: PackView[];

  @ApiProperty({ format: 'date' })
  today: string;
}
