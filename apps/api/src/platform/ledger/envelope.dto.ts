import { Flag, Instant } from '../dto/fields.js';

/** Round every action: when it was sent, what the device's clock said then, and whether it had waited. */
export class EnvelopeDto {
  @Instant()
  sentAt: string;

  @Instant()
  deviceNow: string;

  @Flag()
  queued: boolean;
}
