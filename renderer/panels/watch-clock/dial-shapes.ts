/** Hours once round the dial. */
export const DIAL_HOURS = 12;

/** The ring's edges and the longest wedge, in units of the drawing. */
export const RING_INNER = 60;
export const RING_OUTER = 67;
export const WEDGE_LENGTH = 32;

const HOUR_MS = 3_600_000;
/** A pass of a few minutes still shows as a wedge this wide. */
const NARROWEST_DEG = 5;

/** Degrees clockwise from the top of a moment so long before now: older goes back round, against the clock. */
export function angleOfAge(ageMs: number): number {
  return -(ageMs / (DIAL_HOURS * HOUR_MS)) * 360;
}

/** The age a point of the dial stands for, 0 up to twelve hours; x to the right, y down, from the dial's middle. */
export function ageOfPoint(x: number, y: number): number {
  const clockwise = (Math.atan2(x, -y) * 180) / Math.PI;
  return (((360 - clockwise) % 360) / 360) * DIAL_HOURS * HOUR_MS;
}

/** The point at an angle and distance from the dial's middle. */
export function pointAt(angleDeg: number, radius: number): [x: number, y: number] {
  const angle = (angleDeg * Math.PI) / 180;
  return [Math.sin(angle) * radius, -Math.cos(angle) * radius];
}

/** The outline of a piece of a ring from one angle clockwise to another. A full round is drawn as all but a hair of it. */
export function ringPiece(fromDeg: number, toDeg: number, inner: number, outer: number): string {
  const span = Math.min(359.99, toDeg - fromDeg);
  const large = span > 180 ? 1 : 0;
  const [a, b] = [pointAt(fromDeg, outer), pointAt(fromDeg + span, outer)];
  const [c, d] = [pointAt(fromDeg + span, inner), pointAt(fromDeg, inner)];
  const at = ([x, y]: [number, number]) => `${x.toFixed(2)} ${y.toFixed(2)}`;
  return `M ${at(a)} A ${outer} ${outer} 0 ${large} 1 ${at(b)} L ${at(c)} A ${inner} ${inner} 0 ${large} 0 ${at(d)} Z`;
}

/** The wedge of a pass: where it stands on the dial, and as long as the share of this water it saw. */
export interface Wedge {
  outline: string;
  middleDeg: number;
  tipRadius: number;
}

/** The wedge of a pass between two ages (newest first), or null where all of it lies off the dial. */
export function wedgeOf(newestAgeMs: number, oldestAgeMs: number, seenShare: number): Wedge | null {
  if (newestAgeMs >= DIAL_HOURS * HOUR_MS || oldestAgeMs < 0) return null;
  const from = angleOfAge(Math.min(oldestAgeMs, DIAL_HOURS * HOUR_MS));
  const to = angleOfAge(Math.max(newestAgeMs, 0));
  const spare = Math.max(0, NARROWEST_DEG - (to - from)) / 2;
  const inner = RING_OUTER + 2;
  const tipRadius = inner + Math.max(2, seenShare * WEDGE_LENGTH);
  return {
    outline: ringPiece(from - spare, to + spare, inner, tipRadius),
    middleDeg: (from + to) / 2,
    tipRadius,
  };
}

/** Which of some angles can be labelled without crowding: each at least so many degrees from those before it in the list. */
export function labelled(anglesDeg: readonly number[], roomDeg: number): boolean[] {
  const taken: number[] = [];
  return anglesDeg.map((angle) => {
    const isFree = taken.every((other) => Math.abs(((angle - other + 540) % 360) - 180) >= roomDeg);
    if (isFree) taken.push(angle);
    return isFree;
  });
}
