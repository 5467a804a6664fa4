const PAUSE_MS = 20;
/** Long, for a busy machine: it only bounds how long a failure takes to show. */
const LIMIT_MS = 60_000;

/**
 * Waits until the condition holds, asking again and again.
 * @throws Error when it does not within a minute
 */
export async function until(condition: () => Promise<boolean> | boolean): Promise<void> {
  const end = performance.now() + LIMIT_MS;
  while (!(await condition())) {
    if (performance.now() > end) throw new Error(`Not within ${LIMIT_MS / 1000} s: ${condition.toString()}`);
    await new Promise((resolve) => setTimeout(resolve, PAUSE_MS));
  }
}
