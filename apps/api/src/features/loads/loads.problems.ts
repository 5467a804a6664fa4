import type { ProblemKind } from '../../platform/errors/problem-kind.js';

export const loadProblems = {
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
