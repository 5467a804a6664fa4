import { numberText, openOf, totalMinor, type LineCounts } from './order-lines.js';

export interface MailLine extends LineCounts {
  packName: string;
  /** What the supplier calls it. */
  supplierName: string;
  priceMinor: number | null;
}

export interface MailOrder {
  number: number;
  darkroomName: string;
  supplierName: string;
  currency: string;
  note: string | null;
  lines: readonly MailLine[];
  /** Who the supplier answers to. */
  sender: { name: string; address: string | null };
}

export interface MailText {
  subject: string;
  body: string;
}

/** 'EUR 11.50': minor units with as many decimals as the currency has. */
export function money(minor: number, currency: string): string {
  const format = new Intl.NumberFormat('en-GB', { style: 'currency', currency });
  const decimals = format.resolvedOptions().maximumFractionDigits ?? 0;
  const digits = String(minor).padStart(decimals + 1, '0');
  const whole = digits.slice(0, digits.length - decimals);
  return decimals === 0 ? `${currency} ${whole}` : `${currency} ${whole}.${digits.slice(-decimals)}`;
}

/** A heading stands on one line whatever the names hold. */
const oneLine = (text: string): string => text.replaceAll(/\s+/g, ' ').trim();

/** The order as the supplier gets it. */
export function orderMail(order: MailOrder): MailText {
  const lines = order.lines.filter((line) => line.count > 0);
  const total = totalMinor(lines);
  return {
    subject: oneLine(`Order ${numberText(order.number)} from ${order.darkroomName}`),
    body: letter(order, [
      'please send us:',
      lines.map((line) => asked(line, line.count, order.currency)).join('\n'),
      ...(total === null
        ? []
        : [`By the prices that we know this comes to ${money(total, order.currency)}.`]),
      ...(order.note ? [order.note] : []),
    ]),
  };
}

/** Told to the supplier when the rest of an order is not wanted any more. */
export function cancelMail(order: MailOrder, reason: string): MailText {
  const lines = order.lines.filter((line) => openOf(line) > 0);
  const some = order.lines.some((line) => line.received > 0) ? 'the rest of ' : '';
  return {
    subject: oneLine(`Order ${numberText(order.number)} from ${order.darkroomName}: cancelled`),
    body: letter(order, [
      `we cancel ${some}order ${numberText(order.number)}. Please do not send:`,
      lines.map((line) => `  ${openOf(line)} x ${line.supplierName}`).join('\n'),
      `Why: ${reason}`,
    ]),
  };
}

function asked({ supplierName, packName, priceMinor }: MailLine, count: number, currency: string): string {
  const ours = packName === supplierName ? [] : [`we call it ${packName}`];
  const price = priceMinor === null ? [] : [`${money(priceMinor, currency)} each`];
  const more = [...ours, ...price].join('; ');
  return `  ${count} x ${supplierName}${more === '' ? '' : ` (${more})`}`;
}

function letter(
  { number, darkroomName, supplierName, sender }: MailOrder,
  paragraphs: readonly string[],
): string {
  const answer = sender.address === null ? sender.name : `${sender.name}, ${sender.address}`;
  return [
    `To ${supplierName}:`,
    ...paragraphs,
    `Please answer to ${answer}, and name order ${numberText(number)}.`,
    `${sender.name}\n${darkroomName}\n`,
  ].join('\n\n');
}
