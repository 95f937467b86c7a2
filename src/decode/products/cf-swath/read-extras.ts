import { Problem } from '../../../problems/problem.ts';
import { createBackground, NEVER_LOOKED, type Swath } from '../../../swath/swath.ts';
import { type CfFile, tellProblem, textAttribute } from './cf-file.ts';
import type { SwathVariables } from './find-variables.ts';
import { readDirections } from './read-directions.ts';
import { type FlagField, MISSING_FLAGS, readFlagField } from './read-flag-field.ts';
import { readSpeeds } from './read-speeds.ts';
import { shareFactor } from './units-of-measure.ts';
import { unpackValues } from './unpack-values.ts';

/** Sets the model's wind of a pass as background, where the file has one. */
export function readBackground(file: CfFile, variables: SwathVariables, first: number, swath: Swath): void {
  const { modelSpeed, modelDirection } = variables;
  if (!modelSpeed) return;
  attempt(file, () => {
    const background = createBackground(swath.state.length);
    readSpeeds(file, modelSpeed, first, background.speedMs, Number.NaN);
    if (modelDirection) readDirections(file, modelDirection, first, background.directionFrom, Number.NaN);
    swath.background = background;
    swath.notes.push(`${modelSpeed.name} is a model's wind, kept as background and never shown as seen.`);
  });
}

/** Sets the probability of ice of a pass, 0 to 1, where the file has one. */
export function readIceProbability(file: CfFile, variables: SwathVariables, first: number, swath: Swath): void {
  const variable = variables.iceProbability;
  if (!variable) return;
  attempt(file, () => {
    const probability = new Float32Array(swath.state.length);
    const factor = shareFactor(textAttribute(variable.attributes, 'units'));
    const taking = { first, count: probability.length, factor, plausibleHighest: 1, outOfRange: Number.NaN };
    unpackValues(file, variable, taking, (values, start) => probability.set(values, start));
    swath.iceProbability = probability;
  });
}

/** Reads the flag variables of a pass; the first one's words are the swath's raw flags. */
export function readFlagFields(file: CfFile, variables: SwathVariables, first: number, swath: Swath): FlagField[] {
  return variables.flags.map((variable, index) => {
    const raw = index === 0 ? swath.rawFlags : new Uint32Array(swath.state.length);
    const field = attempt(file, () => readFlagField(file, variable, first, raw));
    return field ?? { name: variable.name, raw: raw.fill(MISSING_FLAGS), meanings: null };
  });
}

/** Takes out whatever the file holds for cells that were never looked at. */
export function clearNeverLooked(swath: Swath): void {
  for (let cell = 0; cell < swath.state.length; cell++) {
    if (swath.state[cell] !== NEVER_LOOKED) continue;
    swath.timeMs[cell] = Number.NaN;
    swath.rawFlags[cell] = MISSING_FLAGS;
    if (swath.iceProbability) swath.iceProbability[cell] = Number.NaN;
    if (!swath.background) continue;
    swath.background.speedMs[cell] = Number.NaN;
    swath.background.directionFrom[cell] = Number.NaN;
  }
}

/** Reads something the wind can do without; what is wrong with it is told beside the swath. */
function attempt<Result>(file: CfFile, read: () => Result): Result | null {
  try {
    return read();
  } catch (thrown) {
    if (!(thrown instanceof Problem)) throw thrown;
    tellProblem(file, thrown);
    return null;
  }
}
