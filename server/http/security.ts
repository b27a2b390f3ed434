import helmet from 'helmet';
import type { RequestHandler } from 'express';

/**
 * Headers of every answer: nothing is loaded from elsewhere, no inline script or style, no
 * framing, no sharing across origins. Pictures may come from memory (`blob:`, `data:`)
 * because a label's preview is drawn there.
 */
export function securityHeaders({ isSecure }: { readonly isSecure: boolean }): RequestHandler {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        'default-src': ["'self'"],
        'img-src': ["'self'", 'data:', 'blob:'],
        'object-src': ["'none'"],
        'base-uri': ["'none'"],
        'form-action': ["'self'"],
        'frame-ancestors': ["'none'"],
      },
    },
    crossOriginOpenerPolicy: { policy: 'same-origin' },
    crossOriginResourcePolicy: { policy: 'same-origin' },
    referrerPolicy: { policy: 'same-origin' },
    // Over plain http on loopback this header would lock the browser out of other local work.
    strictTransportSecurity: isSecure ? { maxAge: 31_536_000, includeSubDomains: true } : false,
    xPoweredBy: true,
  });
}
