import { Problem } from '../../../problems/problem.ts';
import { measureCellSize } from '../../../swath/measure-cell-size.ts';
import { createSwath, type Swath } from '../../../swath/swath.ts';
import { readNetcdfHeader } from '../../containers/netcdf-classic/read-netcdf-header.ts';
import { refuseOtherNetcdf } from '../../containers/netcdf-classic/sniff-netcdf.ts';
import type { ReadSwaths } from '../../read-swaths.ts';
import { applyFlags } from './apply-flags.ts';
import type { CfFile } from './cf-file.ts';
import { describeSource } from './describe-source.ts';
import { fillBackground, fillIceProbability, fillPositions, fillWinds } from './fill-swath.ts';
import { findVariables } from './find-variables.ts';
import { type CfFields, readFields, type WindField } from './read-fields.ts';
import { fillMissingTimes } from './read-times.ts';

/**
 * The swaths of a netCDF classic file that follows the CF conventions: rows of cells with an observed 10-m wind each.
 * A file that is something else throws a Problem that says what; one that holds no cells gives no swath and the
 * problem 'no-cells'. A variable that the wind can do without is left out when it cannot be read, and told.
 */
export function readCfSwaths(bytes: Uint8Array, fileName: string): ReadSwaths {
  const other = refuseOtherNetcdf(bytes, fileName);
  if (other) throw other;
  const header = readNetcdfHeader(bytes, fileName);
  const file: CfFile = { bytes, header, problems: [] };
  const variables = findVariables(header);
  const result: ReadSwaths = {
    format: `netCDF classic (CDF-${header.version})`,
    swaths: [],
    problems: file.problems,
  };
  const lengths = variables.lat.dimensions.map((dimension) => dimension.length);
  if (!lengths.includes(0)) {
    // A merged file has several passes along a leading dimension.
    const [columns, rows, passes = 1] = lengths.toReversed();
    const fields = readFields(file, variables);
    for (let pass = 0; pass < passes; pass++) {
      const swath = buildSwath(file, slicePass(fields, pass, rows * columns), rows, columns);
      if (swath) result.swaths.push(swath);
    }
  }
  if (result.swaths.length === 0) {
    file.problems.push(new Problem('no-cells', 'The file holds no cells: nothing was looked at.', { file: fileName }));
  }
  return result;
}

/** The fields of one pass, as views. */
function slicePass(fields: CfFields, pass: number, cells: number): CfFields {
  const slice = (values: Float64Array) => values.subarray(pass * cells, (pass + 1) * cells);
  const sliceWind = (wind: WindField) => ({
    ...wind,
    speedMs: slice(wind.speedMs),
    directionDeg: slice(wind.directionDeg),
  });
  return {
    lon: slice(fields.lon),
    lat: slice(fields.lat),
    timeMs: slice(fields.timeMs),
    wind: sliceWind(fields.wind),
    background: fields.background && sliceWind(fields.background),
    iceProbability: fields.iceProbability && slice(fields.iceProbability),
    flags: fields.flags.map((field) => ({ ...field, raw: field.raw.subarray(pass * cells, (pass + 1) * cells) })),
    notes: fields.notes,
  };
}

/** One pass as a swath; null where no cell has a position. */
function buildSwath(file: CfFile, fields: CfFields, rows: number, columns: number): Swath | null {
  const tell = (problem: Problem) => file.problems.push(problem.at({ file: file.header.fileName }));
  const swath = createSwath(rows, columns);
  if (fillPositions(swath, fields, tell) === 0) return null;
  swath.notes.push(...fields.notes);
  describeSource(swath, file.header, fields.flags);
  fillTimes(swath, fields.timeMs);
  fillWinds(swath, fields.wind, tell);
  fillBackground(swath, fields.background);
  fillIceProbability(swath, fields.iceProbability);
  for (const problem of applyFlags(swath, fields.flags)) tell(problem);
  if (Number.isNaN(swath.cellSizeM)) swath.cellSizeM = measureCellSize(swath);
  return swath;
}

function fillTimes(swath: Swath, timeMs: Float64Array): void {
  swath.timeMs.set(timeMs);
  const filled = fillMissingTimes(swath.timeMs, swath.state);
  if (filled < 0) throw new Problem('not-a-swath', 'None of the cells has a time.');
  if (filled > 0) swath.notes.push(`${filled} cells had no time of their own and took that of the cell next to them.`);
}
