import { Problem } from '../../../problems/problem.ts';
import type { NetcdfVariable } from '../../containers/netcdf-classic/read-netcdf-header.ts';
import { type CfFile, textAttribute } from './cf-file.ts';
import { speedFactor } from './units-of-measure.ts';
import { OUT_OF_RANGE, unpackValues } from './unpack-values.ts';

/** Speeds beyond this, m/s, are no wind: above any that was measured at sea (no source). */
export const MOST_SPEED_MS = 100;

/**
 * Sets speeds of a pass in m/s, NaN where missing, `outOfRange` where outside the file's own range. A unit we do not
 * know is a Problem: a guess would be a wrong wind.
 */
export function readSpeeds(
  file: CfFile,
  variable: NetcdfVariable,
  first: number,
  speedMs: Float32Array,
  outOfRange = OUT_OF_RANGE,
): void {
  const unit = textAttribute(variable.attributes, 'units');
  const factor = speedFactor(unit);
  if (factor === undefined) {
    const said = unit === '' ? 'states no unit' : `has the unit '${unit}', which we do not know`;
    throw new Problem('unsupported-format', `The speed ${variable.name} ${said}.`, {
      file: file.header.fileName,
      part: `variable ${variable.name}`,
    });
  }
  const taking = { first, count: speedMs.length, factor, plausibleHighest: MOST_SPEED_MS, outOfRange };
  unpackValues(file, variable, taking, (values, start) => speedMs.set(values, start));
}
