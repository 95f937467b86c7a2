/**
 * What a page of ours may load and do: nothing from elsewhere. Styles may stand in the page because the map library sets
 * them there; images may be blobs because it draws its sprites so.
 */
export const contentPolicy = [
  "default-src 'none'",
  "script-src 'self'",
  "connect-src 'self'",
  "font-src 'self'",
  "worker-src 'self'",
  "img-src 'self' data: blob:",
  "style-src 'self' 'unsafe-inline'",
  "base-uri 'none'",
  "form-action 'none'",
  "frame-ancestors 'none'",
].join('; ');

/** The headers that every answer carries, in every host. */
export const safeHeaders: Readonly<Record<string, string>> = {
  'content-security-policy': contentPolicy,
  'x-content-type-options': 'nosniff',
  'referrer-policy': 'no-referrer',
  'cross-origin-opener-policy': 'same-origin',
  'cross-origin-resource-policy': 'same-origin',
  'cache-control': 'no-store',
};
