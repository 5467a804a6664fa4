/** What was begun did not end in time. It may still end, either way. */
export class OutOfTime extends Error {
  override readonly name = 'OutOfTime';
}

/**
 * The outcome, if it comes within so many milliseconds.
 * @throws OutOfTime, and whatever the outcome throws
 */
export async function within<T>(ms: number, outcome: Promise<T>): Promise<T> {
  let timer: NodeJS.Timeout | undefined;
  const limit = new Promise<never>((_, reject) => {
    timer = setTimeout(() => reject(new OutOfTime(`Not within ${ms} ms.`)), ms);
  });
  try {
    return await Promise.race([outcome, limit]);
  } finally {
    clearTimeout(timer);
  }
}
