import helmet from 'helmet';

const YEAR_S = 31_536_000;

/** Headers that hold the browser to this origin. Everything about https follows the public address, not the request. */
export function securityHeaders(publicOrigin: string) {
  const secure = new URL(publicOrigin).protocol === 'https:';
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        'default-src': ["'self'"],
        'script-src': ["'self'"],
        // Emotion writes style elements as the page is built.
        'style-src': ["'self'", "'unsafe-inline'"],
        'img-src': ["'self'", 'blob:', 'data:'],
        'object-src': ["'none'"],
        'base-uri': ["'none'"],
        'form-action': ["'self'"],
        'frame-ancestors': ["'none'"],
        ...(secure ? { 'upgrade-insecure-requests': [] } : {}),
      },
    },
    strictTransportSecurity: secure ? { maxAge: YEAR_S, includeSubDomains: true } : false,
    referrerPolicy: { policy: 'same-origin' },
    xFrameOptions: { action: 'deny' },
  });
}
