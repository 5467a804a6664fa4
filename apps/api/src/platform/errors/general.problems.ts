import type { ProblemKind } from './problem-kind.js';

const AGAIN = 'Nothing was recorded: send it again in a moment.';

export const generalProblems = {
  invalid: {
    status: 400,
    title: 'Something in the form is not right',
    detail: () => 'Look at the fields named here and send it again.',
  },
  malformed: {
    status: 400,
    title: 'Not readable',
    detail: () => 'What was sent cannot be read: its JSON, or an escape in its address, is broken.',
  },
  'not-json': {
    status: 415,
    title: 'Not JSON',
    detail: () => 'Send it as application/json, in UTF-8, as it is or zipped with gzip.',
  },
  'signed-out': {
    status: 401,
    title: 'Signed out',
    detail: () => 'Sign in to go on.',
  },
  'not-allowed': {
    status: 403,
    title: 'Not allowed',
    detail: (least: string) => `This takes a ${least} of the darkroom.`,
  },
  'cross-site': {
    status: 403,
    title: 'Came from another site',
    detail: () => 'Changes are accepted from the darkroom’s own pages only.',
  },
  'not-found': {
    status: 404,
    title: 'Not found',
    detail: () => 'There is nothing here that you can see.',
  },
  'action-differs': {
    status: 409,
    title: 'Already recorded otherwise',
    detail: () => 'This was recorded before with other content; look at the log before you record it again.',
  },
  'too-large': {
    status: 413,
    title: 'Too large',
    detail: () => 'That is more than is accepted in one go.',
  },
  'too-many': {
    status: 429,
    title: 'Too many tries',
    detail: (seconds: number) => `Wait ${seconds === 1 ? 'a second' : `${seconds} seconds`} and try again.`,
  },
  broken: {
    status: 500,
    title: 'Something broke',
    detail: () => 'Try again; if it stays, tell whoever runs the server.',
  },
  unavailable: {
    status: 503,
    title: 'Not ready',
    detail: () => `The server cannot reach its database just now. ${AGAIN}`,
  },
  interrupted: {
    status: 503,
    title: 'Broken off',
    detail: () =>
      'The database went away in the middle of this: nobody knows yet whether it was recorded. Send it again in a moment; an action counts once.',
  },
  busy: {
    status: 503,
    title: 'Busy',
    detail: () => `The server has more to do just now than it can. ${AGAIN}`,
  },
  'held-up': {
    status: 503,
    title: 'Held up',
    detail: () => `Something else is being recorded in the same place and takes long. ${AGAIN}`,
  },
  'too-slow': {
    status: 503,
    title: 'Took too long',
    detail: () =>
      'This took longer than it may and was given up. Send it again in a moment; an action counts once.',
  },
} satisfies Record<string, ProblemKind>;
