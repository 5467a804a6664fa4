import type { ProblemKind } from '../../platform/errors/problem-kind.js';

export const loadProblems = {
  'before-the-mix': {
    status: 422,
    title: 'Before it was mixed',
    detail: (code: string) =>
      `${code} was mixed more than a day after that. Correct the time, or the bottle.`,
  },
  'not-a-format': {
    status: 422,
    title: 'Not a format',
    detail: () => 'A sheet needs its width and its height; a named format takes neither.',
  },
  'nothing-to-decide': {
    status: 409,
    title: 'Nothing to decide',
    detail: () => 'That load was decided or taken back already.',
  },
} satisfies Record<string, ProblemKind>;
