import { createHash } from 'node:crypto';

type Json = null | boolean | number | string | Json[] | { [key: string]: Json };

/** The same JSON whatever the order of its keys. */
function canonical(value: Json): string {
  if (value === null || typeof value !== 'object') return JSON.stringify(value);
  if (Array.isArray(value)) return `[${value.map(canonical).join(',')}]`;
  const members = Object.keys(value)
    .sort()
    .map((key) => `${JSON.stringify(key)}:${canonical(value[key] ?? null)}`);
  return `{${members.join(',')}}`;
}

/**
 * SHA-256 (hex) of an action's content as it was parsed, before defaults, transforms and the clock's correction,
 * so that a new version of the program between two tries changes nothing.
 */
export function contentHash(content: unknown): string {
  // The body parser yields JSON and nothing else.
  return createHash('sha256')
    .update(canonical(content as Json))
    .digest('hex');
}
