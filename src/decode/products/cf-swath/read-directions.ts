import type { NetcdfVariable } from '../../containers/netcdf-classic/read-netcdf-header.ts';
import { type CfFile, textAttribute } from './cf-file.ts';
import { type DirectionSense, readDirectionSense } from './direction-sense.ts';
import { angleFactor } from './units-of-measure.ts';
import { OUT_OF_RANGE, unpackValues } from './unpack-values.ts';

/**
 * Sets directions of a pass as those the wind blows from, 0 <= d < 360, NaN where missing, `outOfRange`
 * where they cannot be. Returns the sense they have in the file; where that or their unit is unknown, nothing is set.
 */
export function readDirections(
  file: CfFile,
  variable: NetcdfVariable,
  first: number,
  directionFrom: Float32Array,
  outOfRange = OUT_OF_RANGE,
): DirectionSense {
  const factor = angleFactor(textAttribute(variable.attributes, 'units'));
  const sense = readDirectionSense(file.header, variable);
  if (factor === undefined || sense === 'unknown') return 'unknown';
  const taking = { first, count: directionFrom.length, factor, plausibleHighest: 360, outOfRange };
  const turn = sense === 'to' ? 180 : 0;
  unpackValues(file, variable, taking, (values, start) => {
    turnDirections(values, turn, outOfRange, directionFrom.subarray(start, start + values.length));
  });
  return sense;
}

/** Rounding in a file's scale factor may carry a full circle this far beyond itself, degrees. */
const SLACK_DEG = 0.01;

/** From here on a number rounds to 360 in 32 bits. */
const LEAST_FULL_CIRCLE = 360 - 2 ** -16;

/** Turns directions from -180 to 360 degrees by 180 or 0, so that 0 <= d < 360 also once they are rounded to 32 bits. */
function turnDirections(values: Float64Array, turn: number, outOfRange: number, directionFrom: Float32Array): void {
  for (let i = 0; i < values.length; i++) {
    const turned = values[i] + turn;
    if (turned >= turn - 180 - SLACK_DEG && turned <= turn + 360 + SLACK_DEG) {
      if (turned >= LEAST_FULL_CIRCLE) directionFrom[i] = Math.max(turned - 360, 0);
      else directionFrom[i] = turned < 0 ? turned + 360 : turned;
    } else directionFrom[i] = Number.isNaN(turned) ? turned : outOfRange;
  }
}
