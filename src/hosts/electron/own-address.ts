/** The scheme of the page and of all it asks for: a standard one, so that paths and origins work as on the web. */
export const OWN_SCHEME = 'crosstrack';

/** The address of the page. */
export const PAGE_ADDRESS = `${OWN_SCHEME}://desk/`;

/** The page's origin as Chromium writes it for a standard scheme. */
export const OWN_ORIGIN = `${OWN_SCHEME}://desk`;

/** Whether an address is one of ours: our scheme and our host, without user, password or port. */
export function isOwnAddress(address: string): boolean {
  const url = URL.parse(address);
  return (
    url !== null &&
    url.protocol === `${OWN_SCHEME}:` &&
    url.host === 'desk' &&
    url.username === '' &&
    url.password === ''
  );
}
