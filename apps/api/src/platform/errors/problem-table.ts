import { bottleProblems } from '../../features/bottles/bottles.problems.js';
import { darkroomProblems } from '../../features/darkrooms/darkrooms.problems.js';
import { loadProblems } from '../../features/loads/loads.problems.js';
import { mixProblems } from '../../features/mixes/mixes.problems.js';
import { orderProblems } from '../../features/orders/orders.problems.js';
import { shelfProblems } from '../../features/shelf/shelf.problems.js';
import { ledgerProblems } from '../ledger/ledger.problems.js';
import { generalProblems } from './general.problems.js';
import type { ProblemKind } from './problem-kind.js';
import { signInProblems } from './sign-in.problems.js';

/**
 * Every code there is. A feature with codes of its own has a `NAME.problems.ts`, spread in here: the one place where the
 * platform names features, so that the union of codes is closed.
 */
export const problemTable = {
  ...generalProblems,
  ...signInProblems,
  ...darkroomProblems,
  ...ledgerProblems,
  ...bottleProblems,
  ...mixProblems,
  ...loadProblems,
  ...orderProblems,
  ...shelfProblems,
} satisfies Record<string, ProblemKind>;
