import type { ProblemKind } from '../../platform/errors/problem-kind.js';

export const orderProblems = {
  'order-changed': {
    status: 409,
    title: 'Somebody changed this order',
    detail: () => 'The order was changed since you opened it. Look at it as it is now.',
  },
  'order-exists': {
    status: 409,
    title: 'Already there',
    detail: () => 'An order or a line with this id is there already. Start the draft anew.',
  },
  'order-not-draft': {
    status: 422,
    title: 'Not a draft any more',
    detail: (number: string) => `Order ${number} is not a draft any more.`,
  },
  'order-not-open': {
    status: 422,
    title: 'Nothing open',
    detail: (number: string) => `Nothing of order ${number} is still to come. Receive it without the order.`,
  },
  'order-closed': {
    status: 422,
    title: 'Closed already',
    detail: (number: string) => `Order ${number} is closed: there is nothing left to cancel.`,
  },
  'order-empty': {
    status: 422,
    title: 'Nothing on it',
    detail: (number: string) => `Order ${number} has no line. Put at least one pack on it.`,
  },
} satisfies Record<string, ProblemKind>;
