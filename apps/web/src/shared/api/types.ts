import type {
  BottleTotals,
  ChemistryDocument,
  Container,
  FilmClass,
  Material,
  Role,
  Thresholds,
} from '@wetside/chemistry';

export type MemberRole = 'member' | 'technician' | 'manager';
export interface DarkroomName {
  id: string;
  shortName: string;
  name: string;
  role: MemberRole;
}
export interface SignedIn {
  person: { id: string; name: string };
  darkrooms: DarkroomName[];
}
export type Me = SignedIn & { now: string };
export interface Darkroom {
  id: string;
  shortName: string;
  name: string;
  zone: string;
  units: { temperature: 'C' | 'F'; volume: 'mL' | 'fl oz' };
  currency: string;
  thresholds: Thresholds & { smallestTankUl: number | null };
  me: { membershipId: string; role: MemberRole; displayName: string };
}
export interface DarkroomMember {
  membershipId: string;
  displayName: string;
  role: MemberRole;
  /** Absent where the list holds only those who are here. */
  leftAt?: string | null;
}

export interface ActionView {
  id: string;
  kind: string;
  happenedAt: string;
  happenedOn: string;
  recordedAt: string;
  seq: number;
  by: { membershipId: string; displayName: string };
  voidedBy: null | { actionId: string; at: string; displayName: string; reason: string | null };
  canUndo: boolean;
}
export type ActionAnswer = { action: ActionView };

export interface BottleView {
  id: string;
  code: string;
  chemistryVersionId: string;
  name: string;
  role: Role;
  material: Material | null;
  totals: BottleTotals;
  holdBy: string | null;
  costMinor: number | null;
  currency: string | null;
  mixedBy: string;
}
export interface BottleList {
  bottles: BottleView[];
  versions: Record<string, ChemistryDocument>;
  today: string;
}
export interface LogEntry {
  action: ActionView;
  sentence: string;
  codes: string[];
  flags: string[];
  voidsActionId?: string;
}
export interface BottlePageData {
  bottle: BottleView;
  document: ChemistryDocument;
  history: LogEntry[];
  today: string;
}
export interface BottleAnswer extends ActionAnswer {
  bottle: BottleView;
}

export interface ChemistryFrom {
  packId: string;
  packName: string;
  form: string;
  volumeUl: number;
  wholeOnly: boolean;
}
export interface ChemistryView {
  id: string;
  versionId: string;
  number: number;
  document: ChemistryDocument;
  nextCode: string;
  from: ChemistryFrom[];
}
export type MixFrom =
  | { kind: 'lot'; lotId: string }
  | { kind: 'opened'; openedPackIds: string[] }
  | { kind: 'stock'; bottleId: string }
  | { kind: 'hand' };
export interface MixContent {
  bottleId: string;
  chemistryVersionId: string;
  volumeUl: number;
  container: Container;
  material: Material | null;
  from: MixFrom;
  note?: string;
}
export interface MixAnswer extends BottleAnswer {
  document: ChemistryDocument;
}

export type FormatName = '135-36' | '135-24' | '120' | '220' | '4x5' | '5x7' | '8x10' | '11x14' | 'sheet';
export interface FilmLine {
  format: FormatName;
  widthMm?: number;
  heightMm?: number;
  count: number;
  filmClass: FilmClass;
  owner?: { membershipId: string } | { guest: { id: string; name: string; reach: string } };
}
export interface LoadContent {
  bottleIds: string[];
  material: Material;
  film: FilmLine[];
  reported?: boolean;
  note?: string;
}
export interface LoadStep {
  bottleId: string;
  code: string;
  material: Material;
  nominalE4: number;
  countedE4: number;
  takenUl: number;
  flags: string[];
}
export interface LoadView {
  flags: string[];
  note: string | null;
  film: (FilmLine & { ownerName: string })[];
  steps: LoadStep[];
}
export interface LoadAnswer extends ActionAnswer {
  load: LoadView;
  bottles: BottleView[];
}
export interface VoidAnswer extends ActionAnswer {
  voided: ActionView;
  bottles: BottleView[];
}
export interface LogPage {
  entries: LogEntry[];
  nextCursor: string | null;
}

export interface OpenedPack {
  id: string;
  partId: string;
  partName: string;
  openedOn: string;
  leftUl: number | null;
  leftMg: number | null;
}
export interface Lot {
  id: string;
  lotNumber: string;
  expiresOn: string | null;
  expiryIsGuess: boolean;
  unopened: number;
  opened: OpenedPack[];
}
export interface SoldBy {
  supplierPackId: string;
  supplierId: string;
  supplierName: string;
  priceMinor: number | null;
  currency: string;
  outUntil: string | null;
}
export interface ShelfPack {
  id: string;
  name: string;
  form: string;
  reorderPoint: number | null;
  reorderUpTo: number | null;
  unopened: number;
  onOrder: number;
  advice: { due: boolean; quantity: number; reason: string };
  firstExpiry: string | null;
  parts: { id: string; name: string; sizeUl: number | null; sizeMg: number | null }[];
  makes: { chemistryId: string; chemistryName: string; volumeUl: number; wholeOnly: boolean }[];
  lots: Lot[];
  soldBy: SoldBy[];
}
export interface Shelf {
  packs: ShelfPack[];
  today: string;
}
export interface ReceiptLine {
  packId: string;
  orderLineId?: string;
  lotId: string;
  lotNumber: string;
  expiresOn: string | null;
  count: number;
  priceMinor?: number | null;
}
export interface ReceiptContent {
  orderId?: string;
  lines: ReceiptLine[];
  note?: string;
  overDeliveryOk?: boolean;
}
export interface ReceiptAnswer extends ActionAnswer {
  shelf: Shelf;
  order?: OrderView;
}

export interface SupplierPack extends Pick<SoldBy, 'supplierPackId' | 'priceMinor' | 'outUntil'> {
  packId: string;
  packName: string;
  supplierName: string;
}
export interface Supplier {
  id: string;
  name: string;
  email: string;
  currency: string;
  minimumMinor: number | null;
  leadDays: number | null;
  packs: SupplierPack[];
}
export type OrderState = 'draft' | 'sent' | 'received' | 'cancelled';
export type MailState = 'waiting' | 'leased' | 'sent' | 'failed' | 'withdrawn';
export interface OrderLine {
  id: string;
  supplierPackId: string;
  packId: string;
  packName: string;
  supplierName: string;
  count: number;
  priceMinor: number | null;
  received: number;
  cancelled: number;
}
export interface OrderView {
  id: string;
  number: number;
  numberText: string;
  supplier: { id: string; name: string; email: string };
  state: OrderState;
  currency: string;
  note: string | null;
  revision: number;
  draftedBy: string;
  draftedAt: string;
  sentBy: string | null;
  sentAt: string | null;
  totalMinor: number | null;
  lines: OrderLine[];
  mail: null | { state: MailState; lastAnswer: string | null };
}
export interface OrderPageData {
  order: OrderView;
  mailText: string | null;
}
export interface OrderAnswer extends ActionAnswer {
  order: OrderView;
}

type BottleEvent = 'low' | 'near-date' | 'spent' | 'past-date' | 'on-hold' | 'load-to-decide';
export type EventKind = BottleEvent | 'reorder-point' | 'none-on-shelf';
export interface NeedsYouRow {
  eventId: string;
  kind: EventKind;
  also?: EventKind;
  openedAt: string;
  crossing: number;
  sentence: string;
  why: string;
  mailedTo: number;
  bottle?: { id: string; code: string; name: string };
  pack?: { id: string; name: string };
  load?: { actionId: string; by: string; sentence: string };
  verb: 'discard' | 'mix' | 'release' | 'order' | 'decide' | 'look';
}
