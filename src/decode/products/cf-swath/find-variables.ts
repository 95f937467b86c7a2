import { Problem } from '../../../problems/problem.ts';
import type { NetcdfHeader, NetcdfVariable } from '../../containers/netcdf-classic/read-netcdf-header.ts';
import { textAttribute } from './cf-file.ts';

/** A wind as speed and direction, or as its eastward and northward parts; the direction may be missing. */
export type WindVariables =
  | { speed: NetcdfVariable; direction: NetcdfVariable | null }
  | { eastward: NetcdfVariable; northward: NetcdfVariable };

/** The variables of a swath file by their meaning. All but the time have the dimensions of the wind. */
export interface SwathVariables {
  lon: NetcdfVariable;
  lat: NetcdfVariable;
  time: NetcdfVariable | null;
  wind: WindVariables;
  /** A model's wind; never the observation. */
  modelSpeed: NetcdfVariable | null;
  modelDirection: NetcdfVariable | null;
  iceProbability: NetcdfVariable | null;
  /** Flag variables, the one about the wind's quality first. */
  flags: NetcdfVariable[];
}

/**
 * Finds the variables by their CF standard names, else by plain words in their names. Throws a Problem: 'not-wind' for
 * a file without an observed wind, 'not-a-swath' for winds without a position for each cell (a grid), and
 * 'unsupported-format' for several winds of which none is marked as the observed one.
 */
export function findVariables(header: NetcdfHeader): SwathVariables {
  const place = { file: header.fileName };
  const winds = header.variables.filter((variable) => isWind(variable));
  if (winds.length === 0) throw new Problem('not-wind', 'This netCDF file holds no wind.', place);

  const position = findPosition(header, winds);
  if (!position) {
    const sentence =
      'This file has winds but no longitude and latitude for each cell of a swath: it is a grid or a list of points.';
    throw new Problem('not-a-swath', sentence, place);
  }
  const sameShape = header.variables.filter((variable) => hasDimensionsOf(variable, position.lat));
  const observed = sameShape.filter((variable) => !isModel(variable));
  const model = sameShape.filter((variable) => isModel(variable));
  return {
    ...position,
    time: findTime(header, position.lat),
    wind: findWind(observed, place),
    modelSpeed: pickOne(model, isSpeed),
    modelDirection: pickOne(model, isDirection),
    iceProbability: sameShape.find((variable) => /\bice prob/.test(wordsOf(variable))) ?? null,
    flags: findFlags(sameShape),
  };
}

/** How sure a variable is what we look for: 2 by its standard name, 1 by plain words, 0 not at all. */
type Sureness = 0 | 1 | 2;
type Recognise = (variable: NetcdfVariable) => Sureness;

/** A variable's names in plain lower-case words. A scatterometer's 'model function' is no model wind. */
function wordsOf(variable: NetcdfVariable): string {
  const words = `${variable.name} | ${textAttribute(variable.attributes, 'long_name')}`;
  return words
    .replace(/[_-]/g, ' ')
    .toLowerCase()
    .replace(/model ?functions?/g, '');
}

function recognise(variable: NetcdfVariable, standardNames: string[], words: RegExp): Sureness {
  const own = wordsOf(variable);
  if (/\b(error|uncertainty|deviation|bias|gust|uncorrected|index|flags?)\b/.test(own)) return 0;
  if (standardNames.includes(textAttribute(variable.attributes, 'standard_name'))) return 2;
  return words.test(own) ? 1 : 0;
}

const isSpeed: Recognise = (variable) => recognise(variable, ['wind_speed'], /\b(wind|model|background) ?speed\b/);
const isDirection: Recognise = (variable) =>
  recognise(
    variable,
    ['wind_from_direction', 'wind_to_direction'],
    /\b(wind|model|background) (from |to )?dir(ection)?\b/,
  );
const isEastward: Recognise = (variable) =>
  recognise(variable, ['eastward_wind'], /\b(eastward|zonal) wind\b|\bu ?(wind|wnd)\b/);
const isNorthward: Recognise = (variable) =>
  recognise(variable, ['northward_wind'], /\b(northward|meridional) wind\b|\bv ?(wind|wnd)\b/);

function isWind(variable: NetcdfVariable): boolean {
  return isSpeed(variable) > 0 || isEastward(variable) > 0;
}

/** A model's value says so in its name, or carries an attribute about the model or background it came from. */
function isModel(variable: NetcdfVariable): boolean {
  const words = /\b(model|background|nwp|nudge|nudging|first guess|forecast|analysis|reanalysis)\b/;
  const hasSource = [...variable.attributes.keys()].some((name) => /^(background|model)_(?!function)/.test(name));
  return hasSource || words.test(wordsOf(variable));
}

/** The one variable that fits best; null where there is none, or where several fit alike. */
function pickOne(variables: NetcdfVariable[], fits: Recognise): NetcdfVariable | null {
  for (const sureness of [2, 1]) {
    const fitting = variables.filter((variable) => fits(variable) === sureness);
    if (fitting.length > 0) return fitting.length === 1 ? fitting[0] : null;
  }
  return null;
}

function findWind(observed: NetcdfVariable[], place: { file: string }): WindVariables {
  const speed = pickOne(observed, isSpeed);
  if (speed) return { speed, direction: pickOne(observed, isDirection) };
  const eastward = pickOne(observed, isEastward);
  const northward = pickOne(observed, isNorthward);
  if (eastward && northward) return { eastward, northward };
  const rivals = observed.filter((variable) => isWind(variable)).map(({ name }) => name);
  if (rivals.length === 0) {
    throw new Problem('not-wind', 'The only wind in this file is a model wind, not an observed one.', place);
  }
  const sentence = `The file does not say which of its winds is the observed one: ${rivals.join(', ')}.`;
  throw new Problem('unsupported-format', sentence, place);
}

/** CF conventions 4.1 and 4.2. */
const isLatitude: Recognise = (variable) => recognisePosition(variable, 'latitude', /^degrees?_?n(orth)?$/i);
const isLongitude: Recognise = (variable) => recognisePosition(variable, 'longitude', /^degrees?_?e(ast)?$/i);

function recognisePosition(variable: NetcdfVariable, standardName: string, units: RegExp): Sureness {
  if (textAttribute(variable.attributes, 'standard_name') === standardName) return 2;
  return units.test(textAttribute(variable.attributes, 'units')) ? 1 : 0;
}

/** The longitude and latitude of each cell of a wind: those named in its `coordinates` (CF 5), else any of its shape. */
function findPosition(
  header: NetcdfHeader,
  winds: NetcdfVariable[],
): { lon: NetcdfVariable; lat: NetcdfVariable } | null {
  for (const wind of winds) {
    if (wind.dimensions.length < 2 || wind.dimensions.length > 3) continue;
    const sameShape = header.variables.filter((variable) => hasDimensionsOf(variable, wind));
    const named = textAttribute(wind.attributes, 'coordinates').split(/\s+/);
    for (const pool of [sameShape.filter(({ name }) => named.includes(name)), sameShape]) {
      const lon = pickOne(pool, isLongitude);
      const lat = pickOne(pool, isLatitude);
      if (lon && lat) return { lon, lat };
    }
  }
  return null;
}

/** The time of each cell, row or pass; of several the one that tells most. */
function findTime(header: NetcdfHeader, cells: NetcdfVariable): NetcdfVariable | null {
  const times = header.variables.filter((variable) => {
    const fits = variable.dimensions.every((own) => own.length === 1 || cells.dimensions.includes(own));
    const { attributes, name } = variable;
    const isTime =
      textAttribute(attributes, 'standard_name') === 'time' || / since /i.test(textAttribute(attributes, 'units'));
    return fits && (isTime || name.toLowerCase() === 'time');
  });
  return times.sort((a, b) => b.dimensions.length - a.dimensions.length)[0] ?? null;
}

/** Flags are known by their standard name or attributes: real files hardly ever link them by ancillary_variables. */
function findFlags(sameShape: NetcdfVariable[]): NetcdfVariable[] {
  const rank = (variable: NetcdfVariable) => {
    if (/\b(status|quality)_flag$/.test(textAttribute(variable.attributes, 'standard_name'))) return 2;
    return /qual|flag/i.test(variable.name) ? 1 : 0;
  };
  const hasFlags = (variable: NetcdfVariable) =>
    rank(variable) === 2 ||
    [...variable.attributes.keys()].some((name) => /^e?flag_(masks|values|meanings)$/.test(name));
  return sameShape.filter(hasFlags).sort((a, b) => rank(b) - rank(a));
}

function hasDimensionsOf(variable: NetcdfVariable, other: NetcdfVariable): boolean {
  return (
    variable.dimensions.length === other.dimensions.length &&
    variable.dimensions.every((dimension, axis) => dimension === other.dimensions[axis])
  );
}
