import { OWN_ORIGIN } from './own-address.ts';

/** Who sends a request, as far as Electron says: a worker has no frame, a first navigation no origin. */
export interface Sender {
  contentsId: number | undefined;
  isMainFrame: boolean | undefined;
  origin: string | undefined;
}

/** Whether a sender is our window, its main frame and our origin; what Electron does not say is not held against it. */
export function isOwnSender(sender: Sender, isOwnContents: (contentsId: number) => boolean): boolean {
  const { contentsId, isMainFrame, origin } = sender;
  if (contentsId !== undefined && !isOwnContents(contentsId)) return false;
  return isMainFrame !== false && isOwnOrigin(origin);
}

/** Whether an origin is ours. None at all is the browser itself, which loads our page. */
export function isOwnOrigin(origin: string | null | undefined): boolean {
  return origin === undefined || origin === null || origin === OWN_ORIGIN;
}
