import { normaliseDegrees } from './units.ts';

const points = [
  'north',
  'north-north-east',
  'north-east',
  'east-north-east',
  'east',
  'east-south-east',
  'south-east',
  'south-south-east',
  'south',
  'south-south-west',
  'south-west',
  'west-south-west',
  'west',
  'west-north-west',
  'north-west',
  'north-north-west',
];

/** The sixteen-point compass word of a direction in degrees; on a boundary the upper point. */
export function compassWord(degrees: number): string {
  return points[Math.floor(normaliseDegrees(degrees) / 22.5 + 0.5) % 16];
}

/** The eight-point compass word of a direction in degrees; on a boundary the upper point. */
export function compassWordOfEight(degrees: number): string {
  return points[(Math.floor(normaliseDegrees(degrees) / 45 + 0.5) % 8) * 2];
}
