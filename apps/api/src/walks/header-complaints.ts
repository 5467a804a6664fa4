export type Headers = Readonly<Record<string, string | string[] | undefined>>;

const CSP: Readonly<Record<string, string>> = {
  'default-src': "'self'",
  'script-src': "'self'",
  'style-src': "'self' 'unsafe-inline'",
  'img-src': "'self' blob: data:",
  'object-src': "'none'",
  'base-uri': "'none'",
  'form-action': "'self'",
  'frame-ancestors': "'none'",
};

/** One Content-Security-Policy, directive to sources. */
function policyOf(headers: Headers): Map<string, string> {
  const text = String(headers['content-security-policy'] ?? '');
  return new Map(
    text
      .split(';')
      .map((directive) => directive.trim().split(/\s+/))
      .map(([name = '', ...sources]) => [name, sources.join(' ')]),
  );
}

function policyComplaints(headers: Headers, secure: boolean): string[] {
  const found = policyOf(headers);
  const wanted = new Map([
    ...Object.entries(CSP),
    ...(secure ? [['upgrade-insecure-requests', ''] as const] : []),
  ]);
  return [...new Set([...found.keys(), ...wanted.keys()])]
    .filter((name) => found.get(name) !== wanted.get(name))
    .map((name) => `${name} is ${found.get(name) ?? 'not there'}.`);
}

/** What is wrong with the headers of an answer. */
export function headerComplaints(
  headers: Headers,
  { secure, api }: { secure: boolean; api: boolean },
): string[] {
  const fixed: [string, string | undefined][] = [
    ['strict-transport-security', secure ? 'max-age=31536000; includeSubDomains' : undefined],
    ['x-content-type-options', 'nosniff'],
    ['referrer-policy', 'same-origin'],
    ['x-frame-options', 'DENY'],
    ['access-control-allow-origin', undefined],
    ['access-control-allow-credentials', undefined],
    ['x-powered-by', undefined],
    ...(api ? [['cache-control', 'no-store'] satisfies [string, string]] : []),
  ];
  return [
    ...policyComplaints(headers, secure),
    ...fixed
      .filter(([name, value]) => headers[name] !== value)
      .map(([name]) => `${name} is ${String(headers[name] ?? 'not there')}.`),
  ];
}

/** What is wrong with one Set-Cookie line. */
export function cookieComplaints(
  line: string,
  { secure, port }: { secure: boolean; port: string },
): string[] {
  const [pair = '', ...rest] = line.split('; ');
  const name = pair.split('=')[0] ?? '';
  const attributes = new Map(
    rest.map((one) => {
      const [key = '', value = ''] = one.split('=');
      return [key.toLowerCase(), value] as const;
    }),
  );
  const shape = secure
    ? /^__Host-wetside-(access|refresh|device)$/
    : new RegExp(`^wetside-(access|refresh|device)-${port}$`);
  return [
    ...(shape.test(name) ? [] : [`${name} is not a name for here.`]),
    ...(attributes.has('httponly') ? [] : [`${name} is open to scripts.`]),
    ...(attributes.get('samesite') === 'Lax' ? [] : [`${name} goes to other sites' requests.`]),
    ...(attributes.get('path') === '/' ? [] : [`${name} has another path.`]),
    ...(attributes.has('domain') ? [`${name} names a domain.`] : []),
    ...(attributes.has('secure') === secure ? [] : [`${name} is ${secure ? 'not ' : ''}secure.`]),
  ];
}
