/** One error of a chain, as the log keeps it. */
export interface DescribedError {
  name: string;
  message: string;
  /** PostgreSQL's or Node's own code. */
  code?: string;
  /** Where it came from: one line a call. */
  at: string[];
}

/**
 * An error and its causes without the values in them: a failed query's message goes on to list its parameters,
 * among them addresses and digests, which belong in no log.
 */
export function describedError(error: unknown): DescribedError[] {
  const chain: DescribedError[] = [];
  for (let at = error; at instanceof Error; at = at.cause) chain.push(described(at));
  return chain.length > 0 ? chain : [{ name: typeof error, message: String(error), at: [] }];
}

function described(error: Error): DescribedError {
  const code = 'code' in error && typeof error.code === 'string' ? { code: error.code } : {};
  const [message = ''] = error.message.split(/\nparams:/);
  const at = (error.stack ?? '')
    .split('\n')
    .filter((line) => /^ {4}at /.test(line))
    .map((line) => line.trim());
  return { name: error.name, message, ...code, at };
}
