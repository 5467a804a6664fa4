const PAUSE_MS = 25;
const LIMIT_MS = 120_000;

/**
 * Waits until the condition holds, asking again and again.
 * @throws Error when it does not within two minutes
 */
export async function until(condition: () => Promise<boolean> | boolean): Promise<void> {
  const end = performance.now() + LIMIT_MS;
  while (!(await condition())) {
    if (performance.now() > end) throw new Error(`Not within ${LIMIT_MS / 1_000} s: ${condition.toString()}`);
    await new Promise((resolve) => setTimeout(resolve, PAUSE_MS));
  }
}
