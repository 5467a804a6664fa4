import type { components } from '@wetside/api-client';
import type { Refined } from './refined.js';

type Schemas = components['schemas'];
type View<Name extends keyof Schemas> = Refined<Schemas[Name]>;
/** An action's content less what is put to it when it is told: its version and its time. */
type Content<Name extends keyof Schemas> = Omit<Schemas[Name], 'v' | 'happenedAt'>;

export type Envelope = Schemas['EnvelopeDto'];

export type SignInRequest = Schemas['SignInRequest'];
export type SignedIn = View<'SignedInView'>;
export type Me = View<'MeView'>;
export type Darkroom = View<'DarkroomView'>;
export type MemberRole = Darkroom['me']['role'];
export type DarkroomMember = View<'MembershipView'>;

export type ActionView = View<'ActionView'>;
export type ActionAnswer = View<'ActionAnswer'>;
export type LogEntry = View<'LogEntryView'>;
export type LogPage = View<'LogAnswer'>;
export type VoidContent = Content<'VoidContentDto'>;
export type VoidAnswer = View<'VoidAnswer'>;

export type BottleView = View<'BottleView'>;
export type BottleList = View<'BottlesAnswer'>;
export type BottlePageData = View<'BottleAnswer'>;
export type BottleActionAnswer = View<'BottleActionAnswer'>;
export type HoldContent = Content<'HoldContentDto'>;
export type DiscardContent = Content<'DiscardContentDto'>;

export type ChemistryView = View<'ChemistryView'>;
export type ChemistryFrom = View<'MadeFromView'>;
export type MixContent = Content<'MixContentDto'>;
export type MixFrom = MixContent['from'];
export type MixAnswer = View<'MixAnswer'>;

export type LoadContent = Content<'LoadContentDto'>;
export type LoadAnswer = View<'LoadAnswer'>;
export type FilmLine = LoadContent['film'][number];
export type FormatName = FilmLine['format'];
export type DecisionContent = Content<'DecisionContentDto'>;

export type Shelf = View<'ShelfView'>;
export type ShelfPack = View<'PackView'>;
export type Lot = View<'LotView'>;
export type OpenedPack = View<'OpenedPackView'>;
export type SoldBy = View<'SoldByView'>;
export type ReceiptContent = Content<'ReceiptContent'>;
export type ReceiptLine = ReceiptContent['lines'][number];
export type ReceiptAnswer = View<'ReceiptAnswer'>;

export type Supplier = View<'SupplierView'>;
export type SettingChangeContent = Content<'SettingChangeContent'>;

export type OrderView = View<'OrderView'>;
export type OrderState = OrderView['state'];
export type OrderPageData = View<'OneOrderAnswer'>;
export type OrderAnswer = View<'OrderActionAnswer'>;
export type OrderDraftContent = Content<'OrderDraftContent'>;
export type OrderSendingContent = Content<'OrderSendingContent'>;
export type OrderCancellationContent = Content<'OrderCancellationContent'>;
export type ChangeOrder = Schemas['ChangeOrder'];

export type NeedsYouRow = View<'NeedsYouRowView'>;
export type EventKind = NeedsYouRow['kind'];
