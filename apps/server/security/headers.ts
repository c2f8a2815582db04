import helmet from 'helmet';

const nothing = ["'none'"];
const own = ["'self'"];

/** Headers of pages, feeds and the API: nothing from elsewhere, no scripts at all. */
export const pageHeaders = headers({ scriptSrc: nothing, styleSrc: own, imgSrc: own });

/** Headers of the API's own page of documentation, which runs scripts and sets styles of its own. */
export const documentationHeaders = headers({
  scriptSrc: own,
  styleSrc: [...own, "'unsafe-inline'"],
  imgSrc: [...own, 'data:'],
  connectSrc: own,
});

function headers(directives: Readonly<Record<string, string[]>>) {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: nothing,
        fontSrc: own,
        formAction: own,
        baseUri: nothing,
        frameAncestors: nothing,
        ...directives,
      },
    },
    // Without it browsers send forms with an origin of "null", which the request guard refuses.
    referrerPolicy: { policy: 'same-origin' },
    // Whoever puts TLS in front of the server decides on this.
    strictTransportSecurity: false,
  });
}
