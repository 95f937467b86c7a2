/**
 * Our own set of cell flags, whatever the file's table was: bit n of a cell's flag word is entry n of this list.
 * Every flag means 'this applies to the cell'; none means 'good'. A bit that is not set was either found false or never
 * checked: a swath's notes say which checks its producer makes.
 */
export const flagNames = [
  'landInCell',
  'iceInCell',
  'rain',
  'rainCheckNotUsable',
  'tooFewLooks',
  'poorLookGeometry',
  'noisyLook',
  'monitoringNotRun',
  'monitoringAlarm',
  'fitQualityFailed',
  'fieldConsistencyFailed',
  'noWindSolution',
  'above30Ms',
  'atMost3Ms',
  'noBackgroundUsed',
  'redundant',
  'radarFitTooFar',
  'outOfRange',
  'directionUnknown',
  'qualityUnknown',
] as const;

export type FlagName = (typeof flagNames)[number];

/** The mask of each flag in a cell's flag word. */
export const flagBit = Object.fromEntries(flagNames.map((name, index) => [name, 2 ** index])) as Record<
  FlagName,
  number
>;

/** Each flag in plain words, as the card and the terminal say it. */
export const flagWords: Record<FlagName, string> = {
  landInCell: 'land in the cell',
  iceInCell: 'ice in the cell',
  rain: 'rain detected',
  rainCheckNotUsable: 'rain check not usable',
  tooFewLooks: 'too few good radar looks',
  poorLookGeometry: 'poor look geometry',
  noisyLook: 'noisy radar look',
  monitoringNotRun: 'batch monitoring not run',
  monitoringAlarm: 'batch monitoring alarm',
  fitQualityFailed: 'fit-quality check failed',
  fieldConsistencyFailed: 'field-consistency check failed',
  noWindSolution: 'no wind solution',
  above30Ms: 'above 30 m/s',
  atMost3Ms: '3 m/s or less',
  noBackgroundUsed: 'no background used',
  redundant: 'redundant (overlap)',
  radarFitTooFar: 'radar fit too far',
  outOfRange: 'a value is outside its physical range',
  directionUnknown: 'direction not known',
  qualityUnknown: 'quality not stated by the file',
};

/** The four kinds of doubt the user can switch, each a mask of flags. Normal conditions (3 m/s or less) are no doubt. */
export const doubtKinds = ['rain', 'land', 'ice', 'quality'] as const;
export type DoubtKind = (typeof doubtKinds)[number];

export const doubtMask: Record<DoubtKind, number> = {
  rain: flagBit.rain,
  land: flagBit.landInCell,
  ice: flagBit.iceInCell,
  quality:
    flagBit.tooFewLooks |
    flagBit.poorLookGeometry |
    flagBit.noisyLook |
    flagBit.monitoringAlarm |
    flagBit.fitQualityFailed |
    flagBit.fieldConsistencyFailed |
    flagBit.noWindSolution |
    flagBit.radarFitTooFar |
    flagBit.outOfRange,
};

/** The names of the flags set in a word, in the list's order. */
export function listFlags(word: number): FlagName[] {
  return flagNames.filter((name) => (word & flagBit[name]) !== 0);
}
