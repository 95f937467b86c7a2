import { beaufortOfSpeed } from './beaufort.ts';
import { type DoubtKind, doubtKinds, doubtMask } from './flags.ts';

/** What the user has switched off. Switches change the drawing and are always counted; analysis sees every wind. */
export interface Switches {
  /** Classes shown, 0 to 12: entry n says whether Beaufort n is drawn. */
  beaufortShown: boolean[];
  /** Kinds of doubt whose cells are drawn. */
  doubtShown: Record<DoubtKind, boolean>;
}

/** Everything shown: how the chart opens, since a flag must never hide a storm unasked. */
export function showEverything(): Switches {
  return {
    beaufortShown: new Array<boolean>(13).fill(true),
    doubtShown: { rain: true, land: true, ice: true, quality: true },
  };
}

/** The flags whose cells the switches hide, as one mask. */
export function hiddenFlagMask(switches: Switches): number {
  return doubtKinds.reduce((mask, kind) => (switches.doubtShown[kind] ? mask : mask | doubtMask[kind]), 0);
}

/** Whether the switches hide a wind of this speed and these flags. */
export function isHiddenBySwitches(speedMs: number, flags: number, switches: Switches): boolean {
  return (flags & hiddenFlagMask(switches)) !== 0 || !switches.beaufortShown[beaufortOfSpeed(speedMs)];
}
