import type { FlagName } from '../../../wind/flags.ts';

/** A table that a cell's flag word follows. */
export interface FlagTable {
  widthBits: number;
  /** Our flag of bit 1, 2, ...; bit 1 is the most significant (FM 94 flag tables). Null where the table has no text. */
  flags: readonly (FlagName | null)[];
}

/** The flag table of an element, or undefined where its bits cannot be checked against the winds. */
export function findFlagTable(descriptor: number): FlagTable | undefined {
  return tables.get(descriptor);
}

/** FM 94 flag table 0 21 155; its main producer also sets a 17th bit, which the table does not have. */
const fanBeam: FlagTable = {
  widthBits: 24,
  flags: [
    'tooFewLooks',
    'poorLookGeometry',
    'noisyLook',
    'monitoringNotRun',
    'monitoringAlarm',
    'fitQualityFailed',
    'fieldConsistencyFailed',
    'landInCell',
    'iceInCell',
    'noWindSolution',
    'above30Ms',
    'atMost3Ms',
    'rainCheckNotUsable',
    'rain',
    'noBackgroundUsed',
    'redundant',
    'radarFitTooFar',
  ],
};

/** FM 94 flag table 0 21 109: the same texts on the bits it has. */
const pencilBeam: FlagTable = {
  widthBits: 17,
  flags: fanBeam.flags.slice(0, 12).map((flag, index) => (index >= 2 && index < 7 ? null : flag)),
};

const tables = new Map<number, FlagTable>([
  [21155, fanBeam],
  [21109, pencilBeam],
]);
