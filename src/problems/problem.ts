/** The closed list of ways to say no. A code is stable; the sentence beside it is for people. */
export const problemCodes = [
  'not-found',
  'not-readable',
  'unknown-format',
  'unsupported-format',
  'unsupported-operator',
  'unknown-descriptor',
  'truncated',
  'damaged',
  'no-cells',
  'not-a-swath',
  'not-wind',
  'direction-not-stated',
  'flags-unknown',
  'values-out-of-range',
  'bad-input',
  'not-stored',
  'archive-too-new',
  'archive-damaged',
  'stopped',
  'refused',
  'internal',
] as const;

export type ProblemCode = (typeof problemCodes)[number];

/** Where something went wrong. Every part that is known is given. */
export interface Place {
  /** File name or path as the user gave it. */
  file?: string;
  /** The part of the file in its own terms: 'message 3', 'variable wind_speed', 'subset 17'. */
  part?: string;
  /** Offset from the first byte of the file, counted from 0. */
  byte?: number;
}

/** The one way to say no: a code from the closed list, a sentence for people, and where. */
export class Problem extends Error {
  override readonly name = 'Problem';
  readonly code: ProblemCode;
  readonly place: Place;

  constructor(code: ProblemCode, message: string, place: Place = {}) {
    super(message);
    this.code = code;
    this.place = place;
  }

  /** The same problem with more of its place known; what is already known stays. */
  at(place: Place): Problem {
    return new Problem(this.code, this.message, { ...place, ...this.place });
  }
}

/** The place in words: 'storm.bufr, message 3, byte 1402'; empty when nothing is known. */
export function describePlace(place: Place): string {
  const parts = [place.file, place.part, place.byte === undefined ? undefined : `byte ${place.byte}`];
  return parts.filter((part) => part !== undefined).join(', ');
}

/** Any thrown value as a Problem; what is not one becomes 'internal' with its message kept. */
export function toProblem(thrown: unknown, place: Place = {}): Problem {
  if (thrown instanceof Problem) return thrown.at(place);
  return new Problem('internal', thrown instanceof Error ? thrown.message : String(thrown), place);
}
