import type { NetcdfValue } from '../decode/containers/netcdf-classic/netcdf-types.ts';
import {
  cBandFlagWords,
  type FlagFamily,
  type FlagWord,
  kuBandFlagWords,
} from '../decode/products/cf-swath/flag-words.ts';
import { NEVER_LOOKED, type Swath, WIND } from '../swath/swath.ts';
import { flagBit } from '../wind/flags.ts';
import { encodeNetcdf, type NetcdfContentVariable } from './encode-netcdf.ts';

/** How a swath is to be written, where not as its own band and source suggest. */
export interface CfSwathOptions {
  /** Which family of files to be like: their layout and flag words differ. */
  family?: FlagFamily;
  title?: string;
  source?: string;
  /** The netCDF classic version, 1 where not given. */
  version?: 1 | 2 | 5;
}

/** A swath as a netCDF file after the CF conventions. Solutions and beams have no place in it. */
export function encodeCfSwath(swath: Swath, options: CfSwathOptions = {}): Uint8Array<ArrayBuffer> {
  const family = options.family ?? (swath.band === 'Ku' ? 'ku-band' : 'c-band');
  const radar = family === 'ku-band' ? 'Ku-band pencil-beam scatterometer' : 'C-band fan-beam scatterometer';
  return encodeNetcdf({
    version: options.version ?? 1,
    dimensions: [
      { name: 'NUMROWS', length: swath.rows },
      { name: 'NUMCELLS', length: swath.columns },
    ],
    attributes: {
      title: options.title ?? `${radar}, ocean surface wind vectors`,
      Conventions: 'CF-1.6',
      source: options.source ?? swath.sourceAsRead ?? radar,
      ...(swath.cellSizeM > 0 && { pixel_size_on_horizontal: `${(swath.cellSizeM / 1000).toFixed(1)} km` }),
      comment: 'All wind directions in oceanographic convention (0 deg. flowing North)',
    },
    variables: family === 'c-band' ? listCBandVariables(swath) : listKuBandVariables(swath),
  });
}

const TIME_ORIGIN_MS = Date.UTC(1990, 0, 1);
const TIME_UNITS = 'seconds since 1990-01-01 00:00:00';
const SHORT_FILL = -32767;
const INT_FILL = -2147483647;

/** Everything packed in whole numbers; a time for each cell; the model's wind before the observed one. */
function listCBandVariables(swath: Swath): NetcdfContentVariable[] {
  const { background, iceProbability, solutions } = swath;
  const secondsOf = (cell: number) => (swath.timeMs[cell] - TIME_ORIGIN_MS) / 1000;
  const fitOf = (cell: number) =>
    solutions?.fitDistance[cell * solutions.slots + swath.chosenSolution[cell] - 1] ?? Number.NaN;
  const ofModel = { background_wind_source: 'numerical model' };
  return [
    pack(swath, 'time', 'int', { standard_name: 'time', units: TIME_UNITS }, 1, [0, 2147483647], secondsOf),
    ...listPositions(swath),
    ...(background
      ? [
          packSpeed(swath, 'model_speed', 'model wind speed at 10 m', background.speedMs, ofModel),
          packDirection(swath, 'model_dir', 'model wind direction at 10 m', background.directionFrom, ofModel),
        ]
      : []),
    ...(iceProbability
      ? [
          pack(
            swath,
            'ice_prob',
            'short',
            { long_name: 'ice probability', units: '1' },
            0.001,
            [0, 1000],
            (cell) => iceProbability[cell],
          ),
        ]
      : []),
    {
      name: 'wvc_quality_flag',
      type: 'int',
      dimensions: ['NUMROWS', 'NUMCELLS'],
      attributes: {
        _FillValue: Int32Array.of(INT_FILL),
        standard_name: 'status_flag',
        long_name: 'wind vector cell quality',
        coordinates: 'lat lon',
        ...describeFlags(cBandFlagWords, (masks) => Int32Array.from(masks)),
      },
      values: Int32Array.from(swath.state, (state, cell) =>
        state === NEVER_LOOKED ? INT_FILL : toWord(swath.flags[cell], cBandFlagWords),
      ),
    },
    packSpeed(swath, 'wind_speed', 'wind speed at 10 m', swath.speedMs),
    packDirection(swath, 'wind_dir', 'wind direction at 10 m', swath.directionFrom),
    pack(swath, 'bs_distance', 'short', { long_name: 'backscatter distance', units: '1' }, 0.1, [-500, 500], fitOf),
  ];
}

/** A time for each row; short flags whose bits mean the abnormal case, whatever their words say. */
function listKuBandVariables(swath: Swath): NetcdfContentVariable[] {
  const secondsOfRow = Float64Array.from({ length: swath.rows }, (_, row) => {
    const times = swath.timeMs.subarray(row * swath.columns, (row + 1) * swath.columns);
    const timeMs = times.find((time) => !Number.isNaN(time));
    return timeMs === undefined ? Number.NaN : (timeMs - TIME_ORIGIN_MS) / 1000;
  });
  return [
    {
      name: 'time',
      type: 'double',
      dimensions: ['NUMROWS'],
      attributes: { standard_name: 'time', units: TIME_UNITS },
      values: secondsOfRow,
    },
    ...listPositions(swath),
    packSpeed(swath, 'wind_speed', 'wind speed at 10 m', swath.speedMs),
    packDirection(swath, 'wind_dir', 'wind direction at 10 m', swath.directionFrom),
    {
      name: 'flags',
      type: 'short',
      dimensions: ['NUMROWS', 'NUMCELLS'],
      attributes: {
        _FillValue: Int16Array.of(0x7fff),
        valid_min: Int16Array.of(0),
        valid_max: Int16Array.of(kuBandFlagWords.reduce((sum, { mask }) => sum + mask, 0)),
        long_name: 'wind vector cell quality',
        coordinates: 'lat lon',
        ...describeFlags(kuBandFlagWords, (masks) => Int16Array.from(masks)),
      },
      values: Int16Array.from(swath.state, (state, cell) => {
        if (state === NEVER_LOOKED) return 0x7fff;
        return state === WIND ? toWord(swath.flags[cell], kuBandFlagWords) : toStoppedWord(swath.flags[cell]);
      }),
    },
  ];
}

function describeFlags(
  words: readonly FlagWord[],
  toMasks: (masks: number[]) => NetcdfValue,
): Record<string, NetcdfValue> {
  return {
    flag_masks: toMasks(words.map(({ mask }) => mask)),
    flag_meanings: words.map(({ word }) => word).join(' '),
  };
}

/** The file's word for our flags: of two words for one flag the first. */
function toWord(flags: number, words: readonly FlagWord[]): number {
  return words.reduce((raw, { flag, mask }, index) => {
    const isFirst = words.findIndex((other) => other.flag === flag) === index;
    return isFirst && (flags & flagBit[flag]) !== 0 ? raw | mask : raw;
  }, 0);
}

/** Processing stops at the first test that fails, by default the retrieval itself, and leaves all later bits set. */
function toStoppedWord(flags: number): number {
  const failed = kuBandFlagWords.findIndex(({ flag }) => (flags & flagBit[flag]) !== 0);
  const stop = failed >= 0 ? failed : kuBandFlagWords.findIndex(({ flag }) => flag === 'noWindSolution');
  return kuBandFlagWords.slice(stop).reduce((raw, { mask }) => raw | mask, 0);
}

/** Latitude and longitude, the latter from 0 to 360. */
function listPositions(swath: Swath): NetcdfContentVariable[] {
  const lat = { standard_name: 'latitude', long_name: 'latitude', units: 'degrees_north' };
  const lon = { standard_name: 'longitude', long_name: 'longitude', units: 'degrees_east' };
  return [
    pack(swath, 'lat', 'int', lat, 1e-5, [-9000000, 9000000], (cell) => swath.lat[cell]),
    pack(swath, 'lon', 'int', lon, 1e-5, [0, 36000000], (cell) => (swath.lon[cell] + 360) % 360),
  ];
}

function packSpeed(
  swath: Swath,
  name: string,
  longName: string,
  speedMs: Float32Array,
  extra: Record<string, string> = {},
): NetcdfContentVariable {
  const words = { standard_name: 'wind_speed', long_name: longName, units: 'm s-1', ...extra, coordinates: 'lat lon' };
  return pack(swath, name, 'short', words, 0.01, [0, 5000], (cell) => speedMs[cell]);
}

/** Directions to where the wind blows, above 0 up to 360: north is written as 360. */
function packDirection(
  swath: Swath,
  name: string,
  longName: string,
  directionFrom: Float32Array,
  extra: Record<string, string> = {},
): NetcdfContentVariable {
  const names = { standard_name: 'wind_to_direction', long_name: longName, units: 'degree' };
  return pack(swath, name, 'short', { ...names, ...extra, coordinates: 'lat lon' }, 0.1, [0, 3600], (cell) => {
    const to = Math.round(((directionFrom[cell] + 180) % 360) * 10) / 10;
    return to === 0 ? 360 : to;
  });
}

/** A variable of packed whole numbers; what is NaN becomes the fill value. */
function pack(
  swath: Swath,
  name: string,
  type: 'short' | 'int',
  words: Record<string, string>,
  scale: number,
  [lowest, highest]: [number, number],
  readCell: (cell: number) => number,
): NetcdfContentVariable {
  const create = (numbers: number[]) => (type === 'short' ? Int16Array.from(numbers) : Int32Array.from(numbers));
  const fill = type === 'short' ? SHORT_FILL : INT_FILL;
  const packed = Array.from(swath.state, (state, cell) => {
    const value = Math.round(readCell(cell) / scale);
    return state === NEVER_LOOKED || Number.isNaN(value) ? fill : value;
  });
  return {
    name,
    type,
    dimensions: ['NUMROWS', 'NUMCELLS'],
    attributes: {
      _FillValue: create([fill]),
      missing_value: create([fill]),
      valid_min: create([lowest]),
      valid_max: create([highest]),
      ...words,
      scale_factor: Float64Array.of(scale),
      add_offset: Float64Array.of(0),
    },
    values: create(packed),
  };
}
