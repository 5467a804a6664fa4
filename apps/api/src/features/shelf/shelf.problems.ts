import type { ProblemKind } from '../../platform/errors/problem-kind.js';

export const shelfProblems = {
  'lot-empty': {
    status: 422,
    title: 'None left of that lot',
    detail: (lot: string) =>
      `There is no unopened pack of lot ${lot} on the shelf. Choose another, or receive it first.`,
  },
  'more-than-pack-makes': {
    status: 422,
    title: 'More than a pack makes',
    detail: (litres: string) => `One pack makes ${litres} L. Mix that or less.`,
  },
  'whole-only': {
    status: 422,
    title: 'Mixed whole only',
    detail: (litres: string) => `A powder packet is mixed whole: it makes ${litres} L.`,
  },
  'opened-too-little': {
    status: 422,
    title: 'Not enough in the opened pack',
    detail: (part: string) => `There is not enough left of ${part} for that. Mix less, or open another pack.`,
  },
  'more-than-ordered': {
    status: 422,
    title: 'More than was ordered',
    detail: () => 'More came than is open on the order. Check the count, or say that it is right.',
  },
} satisfies Record<string, ProblemKind>;
