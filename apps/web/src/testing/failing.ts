import { timeoutManager } from '@tanstack/react-query';

/** What the server may say no with, by status, for reasons that no field has. */
export const refusals = [
  [400, 'invalid', 'Look at the fields named here and send it again.'],
  [404, 'not-found', 'There is nothing here that you can see.'],
  [409, 'action-differs', 'This was recorded before with other content.'],
  [413, 'too-large', 'That is more than is accepted in one go.'],
  [422, 'not-now', 'This cannot be done as things are.'],
] as const;

/** Answers after which nobody knows, or nothing but time stands in the way; of status 0 there is none. */
export const unknowns = [
  [429, 'too-many', 'Wait 4 seconds and try again.'],
  [0, '', 'No signal. Nothing came back from the server.'],
  [503, 'busy', 'The server has more to do just now than it can.'],
] as const;

/** Tries again come at once, so that a test need not wait as a person would. */
export function hurryTries(): void {
  timeoutManager.setTimeoutProvider({
    setTimeout: (callback, delay) => setTimeout(callback, delay > 10_000 ? delay : 0),
    clearTimeout: (id) => clearTimeout(id as ReturnType<typeof setTimeout>),
    setInterval: (callback, delay) => setInterval(callback, delay),
    clearInterval: (id) => clearInterval(id as ReturnType<typeof setInterval>),
  });
}
