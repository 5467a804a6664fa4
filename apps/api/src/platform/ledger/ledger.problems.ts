import type { ProblemKind } from '../errors/problem-kind.js';

export const ledgerProblems = {
  'in-the-future': {
    status: 422,
    title: 'Not yet',
    detail: () => 'That is more than 5 minutes from now. Check the time, or the clock of this device.',
  },
  'too-long-ago': {
    status: 403,
    title: 'Too long ago',
    detail: () => 'Over 30 days back takes a technician. Ask one to record it.',
  },
  'void-of-void': {
    status: 422,
    title: 'Cannot be taken back',
    detail: () => 'A void is never voided. Record what happened anew.',
  },
  'cannot-be-voided': {
    status: 422,
    title: 'Cannot be taken back',
    detail: (what: string) => what,
  },
  'already-voided': {
    status: 409,
    title: 'Already taken back',
    detail: () => 'Somebody voided this already; the log shows who.',
  },
  'leans-on-it': {
    status: 409,
    title: 'Something leans on it',
    detail: (what: string) => what,
  },
  'undo-too-late': {
    status: 403,
    title: 'Too late to undo',
    detail: () => 'Undo is open for 12 hours. A technician can still void it.',
  },
} satisfies Record<string, ProblemKind>;
