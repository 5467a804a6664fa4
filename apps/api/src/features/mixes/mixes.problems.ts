import type { ProblemKind } from '../../platform/errors/problem-kind.js';

export const mixProblems = {
  'does-not-make': {
    status: 422,
    title: 'Does not make that',
    detail: (what: string) => `That does not make ${what}. Choose what it is mixed from.`,
  },
  'volume-over-container': {
    status: 422,
    title: 'Too much for the container',
    detail: () => 'The container holds less than that. Choose a larger one, or mix less.',
  },
  'cannot-mix': {
    status: 422,
    title: 'Cannot be mixed so',
    detail: (why: string) => why,
  },
  'stock-too-little': {
    status: 422,
    title: 'Not enough in the bottle',
    detail: (code: string) => `${code} does not hold that much. Mix less, or use another bottle.`,
  },
  'stock-closed': {
    status: 422,
    title: 'Not to be mixed from',
    detail: (why: string) => why,
  },
} satisfies Record<string, ProblemKind>;
