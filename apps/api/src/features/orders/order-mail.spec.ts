import { cancelMail, money, orderMail, type MailOrder } from './order-mail.js';

const order: MailOrder = {
  number: 7,
  darkroomName: 'Cellar darkroom',
  supplierName: 'Bromide Street Supplies',
  currency: 'EUR',
  note: 'Ring at the yard door.',
  lines: [
    {
      packName: 'Rapid fixer 1 L',
      supplierName: 'Fix-1000',
      count: 2,
      received: 0,
      cancelled: 0,
      priceMinor: 1150,
    },
    { packName: 'Wash aid', supplierName: 'Wash aid', count: 1, received: 0, cancelled: 0, priceMinor: 6100 },
    {
      packName: 'Stop bath',
      supplierName: 'Stop-500',
      count: 0,
      received: 0,
      cancelled: 0,
      priceMinor: null,
    },
  ],
  sender: { name: 'Ines', address: 'ines@example.org' },
};

it('names every line, the number, the darkroom and who to answer', () => {
  const { subject, body } = orderMail(order);
  expect(subject).toBe('Order 0007 from Cellar darkroom');
  expect(body).toBe(
    [
      'To Bromide Street Supplies:',
      '',
      'please send us:',
      '',
      '  2 x Fix-1000 (we call it Rapid fixer 1 L; EUR 11.50 each)',
      '  1 x Wash aid (EUR 61.00 each)',
      '',
      'By the prices that we know this comes to EUR 84.00.',
      '',
      'Ring at the yard door.',
      '',
      'Please answer to Ines, ines@example.org, and name order 0007.',
      '',
      'Ines',
      'Cellar darkroom',
      '',
    ].join('\n'),
  );
});

it('leaves the sum out when a price is not known', () => {
  const lines = order.lines.map((line) => ({ ...line, priceMinor: null }));
  expect(orderMail({ ...order, lines }).body).not.toContain('comes to');
});

it('keeps a heading on one line', () => {
  expect(orderMail({ ...order, darkroomName: 'Cellar\r\nBcc: all' }).subject).toBe(
    'Order 0007 from Cellar Bcc: all',
  );
});

it('cancels what is still to come and nothing else', () => {
  const lines = order.lines.map((line, at) => (at === 0 ? { ...line, received: 1 } : line));
  const { subject, body } = cancelMail({ ...order, lines }, 'bought next door');
  expect(subject).toBe('Order 0007 from Cellar darkroom: cancelled');
  expect(body).toContain(
    'we cancel the rest of order 0007. Please do not send:\n\n  1 x Fix-1000\n  1 x Wash aid\n\nWhy: bought next door',
  );
});

it('writes money with the decimals of its currency', () => {
  expect([money(5, 'EUR'), money(1150, 'EUR'), money(1150, 'JPY')]).toEqual([
    'EUR 0.05',
    'EUR 11.50',
    'JPY 1150',
  ]);
});
