import type { ProblemKind } from '../../platform/errors/problem-kind.js';

export const bottleProblems = {
  'bottle-taken-back': {
    status: 422,
    title: 'No such bottle any more',
    detail: (code: string) => `The mix of ${code} was taken back: it never stood here. Which bottle was it?`,
  },
  'bottle-exists': {
    status: 409,
    title: 'Already there',
    detail: () => 'A bottle with this id is there already. Start the mix anew.',
  },
  'already-discarded': {
    status: 409,
    title: 'Already discarded',
    detail: (code: string) => `${code} has been discarded already.`,
  },
  'not-on-hold': {
    status: 409,
    title: 'Not on hold',
    detail: (code: string) => `${code} is not on hold.`,
  },
  'before-the-mix': {
    status: 422,
    title: 'Before it was mixed',
    detail: (code: string) =>
      `${code} was mixed more than a day after that. Correct the time, or the bottle.`,
  },
} satisfies Record<string, ProblemKind>;
