import helmet from "helmet";

/**
 * Headers that keep the pages to themselves: everything a page needs comes from this service. Transport security
 * is left to whatever stands in front and speaks TLS, since the service itself speaks plain HTTP.
 */
export function securityHeaders() {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        imgSrc: ["'self'", "data:"],
        styleSrc: ["'self'", "'unsafe-inline'"],
        objectSrc: ["'none'"],
        baseUri: ["'self'"],
        formAction: ["'self'"],
        frameAncestors: ["'self'"],
      },
    },
    strictTransportSecurity: false,
    // Both mean something over TLS only; browsers warn about them on plain HTTP.
    crossOriginOpenerPolicy: false,
    originAgentCluster: false,
  });
}
