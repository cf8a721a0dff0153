import type { RequestHandler } from 'express';
import helmet from 'helmet';

/** Headers of every page of a local stand-in: nothing but itself and its stylesheet. @param formTargets Origins beside its own that a form may lead to. */
export const standInHeaders = (formTargets: readonly string[] = []): RequestHandler =>
  helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'none'"],
        styleSrc: ["'self'"],
        imgSrc: ['data:'],
        baseUri: ["'none'"],
        frameAncestors: ["'none'"],
        formAction: ["'self'", ...formTargets],
      },
    },
    // Over plain http on the loopback interface this header would have no meaning.
    strictTransportSecurity: false,
  });
