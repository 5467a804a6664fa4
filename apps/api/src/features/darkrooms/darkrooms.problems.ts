import type { ProblemKind } from '../../platform/errors/problem-kind.js';

export const darkroomProblems = {
  'short-name-shape': {
    status: 422,
    title: 'Not a short name',
    detail: () => 'A short name has small letters, digits and single dashes, 32 at the most.',
  },
  'short-name-taken': {
    status: 409,
    title: 'Short name taken',
    detail: (shortName: string) => `Another darkroom here is called ${shortName}; choose another short name.`,
  },
  'zone-unknown': {
    status: 422,
    title: 'Unknown time zone',
    detail: (zone: string) => `No time zone is called ${zone}; write one such as Europe/Vienna.`,
  },
} satisfies Record<string, ProblemKind>;
