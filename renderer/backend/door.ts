import { TOKEN_HEADER } from '../../src/contract/routes.ts';

/** How the host is reached: always the page's own origin, with the token of this launch where the host gave one. */
export interface Door {
  origin: string;
  headers: Record<string, string>;
}

/** The door of a page's address. The token stands in the fragment and stays there, so that a reload still has it. */
export function findDoor(location: { origin: string; hash: string }): Door {
  const token = location.hash.slice(1);
  return { origin: location.origin, headers: token ? { [TOKEN_HEADER]: token } : {} };
}
