import { Problem } from '../../../problems/problem.ts';
import type { NetcdfVariable } from '../../containers/netcdf-classic/read-netcdf-header.ts';
import { type CfFile, textAttribute } from './cf-file.ts';
import { type DirectionSense, readDirectionSense } from './direction-sense.ts';
import type { SwathVariables } from './find-variables.ts';
import { type FlagField, readFlagField } from './read-flag-field.ts';
import { readTimes } from './read-times.ts';
import { angleFactor, shareFactor, speedFactor } from './units-of-measure.ts';
import { unpackValues } from './unpack-values.ts';

/** A wind in our units, in the sense the file gives its directions; NaN where missing. */
export interface WindField {
  speedMs: Float64Array;
  directionDeg: Float64Array;
  sense: DirectionSense;
}

/** All that is read of a file, for every cell of all its passes; NaN where missing. */
export interface CfFields {
  lon: Float64Array;
  lat: Float64Array;
  timeMs: Float64Array;
  wind: WindField;
  background: WindField | null;
  iceProbability: Float64Array | null;
  flags: FlagField[];
  /** What a reader should know about how they were read. */
  notes: string[];
}

// The most each quantity can be, in its unit: see unpackValues.
const MOST_LAT = 90;
const MOST_LON = 360;
const MOST_DIRECTION_DEG = 360;
const MOST_SPEED_MS = 100;

/** Reads and unpacks the variables of a swath file. What the wind can do without is told and left out when unreadable. */
export function readFields(file: CfFile, variables: SwathVariables): CfFields {
  if (!variables.time) {
    throw new Problem('not-a-swath', 'This file gives no time for its winds.', { file: file.header.fileName });
  }
  const notes: string[] = [];
  return {
    lon: unpackValues(file, variables.lon, MOST_LON),
    lat: unpackValues(file, variables.lat, MOST_LAT),
    timeMs: readTimes(file, variables.time, variables.lat.dimensions),
    wind: readWind(file, variables, notes),
    background: attempt(file, () => readBackground(file, variables, notes)),
    iceProbability: attempt(file, () => readShare(file, variables.iceProbability)),
    flags: variables.flags.flatMap((variable) => attempt(file, () => readFlagField(file, variable)) ?? []),
    notes,
  };
}

function readWind(file: CfFile, { wind }: SwathVariables, notes: string[]): WindField {
  if ('eastward' in wind) {
    notes.push(`Speed and direction are worked out from ${wind.eastward.name} and ${wind.northward.name}.`);
    return windOfParts(readSpeed(file, wind.eastward), readSpeed(file, wind.northward));
  }
  const speedMs = readSpeed(file, wind.speed);
  const direction = wind.direction && readDirection(file, wind.direction);
  if (direction && direction.sense !== 'unknown') {
    if (direction.sense === 'to') notes.push(`The file says where the wind blows to; its directions are turned round.`);
    return { speedMs, ...direction };
  }
  const lack = wind.direction
    ? `The file does not say which way ${wind.direction.name} points: to where the wind blows, or from where it comes`
    : 'The file has no wind direction that can be told from others';
  const place = { file: file.header.fileName, part: `variable ${wind.direction?.name ?? wind.speed.name}` };
  file.problems.push(new Problem('direction-not-stated', `${lack}. Its speeds are kept, directions left out.`, place));
  notes.push(`${lack}.`);
  return { speedMs, directionDeg: new Float64Array(speedMs.length).fill(Number.NaN), sense: 'unknown' };
}

/** Eastward and northward parts always point to where the wind blows: u = -V sin(from), v = -V cos(from). */
function windOfParts(eastwardMs: Float64Array, northwardMs: Float64Array): WindField {
  const directionDeg = eastwardMs.map((u, cell) => (Math.atan2(u, northwardMs[cell]) * 180) / Math.PI);
  const speedMs = eastwardMs.map((u, cell) => Math.hypot(u, northwardMs[cell]));
  return { speedMs, directionDeg, sense: 'to' };
}

/** A model's wind as background. A direction of unknown sense is left out, as for the observed wind. */
function readBackground(file: CfFile, variables: SwathVariables, notes: string[]): WindField | null {
  const { modelSpeed, modelDirection } = variables;
  if (!modelSpeed) return null;
  const speedMs = readSpeed(file, modelSpeed);
  notes.push(`${modelSpeed.name} is a model's wind, kept as background and never shown as seen.`);
  const direction = modelDirection && readDirection(file, modelDirection);
  if (direction && direction.sense !== 'unknown') return { speedMs, ...direction };
  return { speedMs, directionDeg: new Float64Array(speedMs.length).fill(Number.NaN), sense: 'unknown' };
}

function readSpeed(file: CfFile, variable: NetcdfVariable): Float64Array {
  const unit = textAttribute(variable.attributes, 'units');
  const factor = speedFactor(unit);
  if (factor === undefined) {
    const said = unit === '' ? 'states no unit' : `has the unit '${unit}', which we do not know`;
    throw new Problem('unsupported-format', `The speed ${variable.name} ${said}.`, {
      file: file.header.fileName,
      part: `variable ${variable.name}`,
    });
  }
  return inUnit(unpackValues(file, variable, MOST_SPEED_MS / factor), factor);
}

/** A direction whose unit we do not know is of no use either: its sense is then unknown. */
function readDirection(file: CfFile, variable: NetcdfVariable): { directionDeg: Float64Array; sense: DirectionSense } {
  const factor = angleFactor(textAttribute(variable.attributes, 'units'));
  const directionDeg = inUnit(unpackValues(file, variable, MOST_DIRECTION_DEG / (factor ?? 1)), factor ?? 1);
  return { directionDeg, sense: factor === undefined ? 'unknown' : readDirectionSense(file.header, variable) };
}

function readShare(file: CfFile, variable: NetcdfVariable | null): Float64Array | null {
  if (!variable) return null;
  const factor = shareFactor(textAttribute(variable.attributes, 'units'));
  return inUnit(unpackValues(file, variable, 1 / factor), factor);
}

function inUnit(values: Float64Array, factor: number): Float64Array {
  if (factor !== 1) for (let i = 0; i < values.length; i++) values[i] *= factor;
  return values;
}

/** Reads something the wind can do without; what is wrong with it is told beside the swath. */
function attempt<Result>(file: CfFile, read: () => Result): Result | null {
  try {
    return read();
  } catch (thrown) {
    if (!(thrown instanceof Problem)) throw thrown;
    file.problems.push(thrown);
    return null;
  }
}
