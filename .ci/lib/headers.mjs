/**
 * What the page's own policy cannot say. There is no script-src here on purpose: beside the hashes in the page a
 * second one would have to allow every script as well, and the page would stay blank.
 */
export const securityHeaders = {
  'Content-Security-Policy': "frame-ancestors 'none'",
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Permissions-Policy': [
    'screen-wake-lock=(self)',
    'camera=()',
    'display-capture=()',
    'geolocation=()',
    'hid=()',
    'microphone=()',
    'midi=()',
    'payment=()',
    'serial=()',
    'usb=()',
  ].join(', '),
  'Referrer-Policy': 'no-referrer',
  'X-Content-Type-Options': 'nosniff',
};

/**
 * Files under `immutable` carry their hash in their name. Everything else, the service worker above all, is asked for
 * again each time: a worker that a browser keeps for a day is an update that nobody is offered.
 * @param {string} path
 */
export function cacheControl(path) {
  return path.startsWith('/_app/immutable/') ? 'public, max-age=31536000, immutable' : 'no-cache';
}
