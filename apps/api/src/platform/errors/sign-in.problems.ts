import type { ProblemKind } from './problem-kind.js';

export const signInProblems = {
  'sign-in-refused': {
    status: 401,
    title: 'Not signed in',
    detail: () => 'That address and passphrase do not go together.',
  },
  'session-ended': {
    status: 401,
    title: 'Signed out',
    detail: () => 'This sign-in has ended. Sign in again.',
  },
} satisfies Record<string, ProblemKind>;
