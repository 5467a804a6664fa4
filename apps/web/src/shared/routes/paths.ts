const inside = (darkroom: string, rest: string): string => `/d/${encodeURIComponent(darkroom)}/${rest}`;

/** Every address in one place; the router uses the same shapes. */
export const paths = {
  home: '/',
  signIn: '/sign-in',
  sink: (darkroom: string) => inside(darkroom, 'sink'),
  bottle: (darkroom: string, code: string) => inside(darkroom, `bottles/${encodeURIComponent(code)}`),
  mixing: (darkroom: string) => inside(darkroom, 'mixing'),
  newMix: (darkroom: string, chemistry?: string) =>
    inside(darkroom, `mixing/new${chemistry ? `?chemistry=${encodeURIComponent(chemistry)}` : ''}`),
  mixLike: (darkroom: string, code: string) =>
    inside(darkroom, `mixing/new?like=${encodeURIComponent(code)}`),
  shelf: (darkroom: string) => inside(darkroom, 'shelf'),
  receive: (darkroom: string) => inside(darkroom, 'shelf/receive'),
  needsYou: (darkroom: string) => inside(darkroom, 'needs-you'),
  orders: (darkroom: string, show?: string) => inside(darkroom, `orders${show ? `?show=${show}` : ''}`),
  order: (darkroom: string, id: string) => inside(darkroom, `orders/${encodeURIComponent(id)}`),
  log: (darkroom: string) => inside(darkroom, 'log'),
  more: (darkroom: string) => inside(darkroom, 'more'),
};
