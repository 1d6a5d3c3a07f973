import helmet from 'helmet'

/**
 * Headers of every answer. The content policy allows nothing inline; `data:` images are Leaflet's blank tile.
 * @param secure whether people reach the server by https.
 */
export function setHeaders(secure: boolean) {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        'default-src': ["'none'"],
        'script-src': ["'self'"],
        'style-src': ["'self'"],
        'img-src': ["'self'", 'data:', 'blob:'],
        'font-src': ["'self'"],
        'connect-src': ["'self'"],
        'worker-src': ["'self'"],
        'manifest-src': ["'self'"],
        'object-src': ["'none'"],
        'base-uri': ["'none'"],
        'form-action': ["'self'"],
        'frame-ancestors': ["'none'"],
      },
    },
    xFrameOptions: { action: 'deny' },
    strictTransportSecurity: secure,
    referrerPolicy: { policy: 'same-origin' },
  })
}
