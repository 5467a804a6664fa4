import { isFromOwnPages } from './cross-site.guard.js';

const OWN = 'https://darkroom.example';
const SITES = ['same-origin', 'same-site', 'cross-site', 'none', '', undefined];
const ORIGINS = [
  OWN,
  'https://elsewhere.example',
  'http://darkroom.example',
  'https://darkroom.example:8443',
  'https://darkroom.example.elsewhere.example',
  'HTTPS://darkroom.example/',
  'null',
  '',
  undefined,
];
const METHODS = ['POST', 'PUT', 'PATCH', 'DELETE'];

/** Every way to say where a change comes from, as one line of text. */
const combinations = METHODS.flatMap((method) =>
  SITES.flatMap((site) => ORIGINS.map((origin) => ({ method, site, origin }))),
);
const line = ({ method, site, origin }: (typeof combinations)[number]) =>
  `${method} ${site ?? 'unsaid'} ${origin ?? 'unsaid'}`;

it('a change is taken from the own pages, by Sec-Fetch-Site or else by Origin, and in no other case', () => {
  const taken = combinations.filter((from) => isFromOwnPages(from, OWN)).map(line);
  const wanted = METHODS.flatMap((method) => [
    // What the browser itself says of the site stands, whatever the other header holds.
    ...ORIGINS.map((origin) => `${method} same-origin ${origin ?? 'unsaid'}`),
    // A browser too old for it says at least the origin.
    `${method} unsaid ${OWN}`,
  ]);
  expect(combinations).toHaveLength(216);
  expect(taken).toEqual(wanted);
});

it.each(['GET', 'HEAD', 'OPTIONS'])('a %s only reads, and may come from anywhere', (method) => {
  for (const site of SITES)
    for (const origin of ORIGINS) expect(isFromOwnPages({ method, site, origin }, OWN)).toBe(true);
});
