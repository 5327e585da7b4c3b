import helmet from 'helmet'
import type { RequestHandler } from 'express'

/** Strict headers: everything the page needs comes from the application itself. */
export function securityHeaders(tls: boolean): RequestHandler {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        objectSrc: ["'none'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'"],
        connectSrc: ["'self'"],
        workerSrc: ["'self'"],
        manifestSrc: ["'self'"],
        // On plain http (one machine, loopback) an upgrade would break every address
        upgradeInsecureRequests: tls ? [] : null,
      },
    },
    strictTransportSecurity: tls,
    referrerPolicy: { policy: 'same-origin' },
  })
}
