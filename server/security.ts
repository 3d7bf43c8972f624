import helmet from 'helmet'

/** Everything comes from this origin; nothing inline runs. No `upgrade-insecure-requests`: shops serve plain HTTP too. */
export const security = () =>
  helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        workerSrc: ["'self'"],
        manifestSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
      },
    },
    referrerPolicy: { policy: 'same-origin' },
    // Said by whoever ends TLS: on plain HTTP it means nothing.
    strictTransportSecurity: false,
    // Meaningless, and warned of by browsers, on plain HTTP beyond loopback.
    crossOriginOpenerPolicy: false,
    originAgentCluster: false,
    xFrameOptions: { action: 'deny' },
  })
