import type { RequestHandler } from 'express';
import helmet from 'helmet';

/** Headers that fit what Vite builds: our own scripts, styles, fonts and sockets; pictures also from memory. */
export function securityHeaders(publicOrigin: string | undefined): RequestHandler {
  const https = publicOrigin?.startsWith('https:') ?? false;
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'"],
        // React writes styles through the DOM, which this allows; markup with a style attribute stays refused.
        styleSrcAttr: ["'none'"],
        imgSrc: ["'self'", 'blob:', 'data:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
      },
    },
    // Without https these would send people to an address that does not answer.
    strictTransportSecurity: https,
    referrerPolicy: { policy: 'same-origin' },
  });
}
