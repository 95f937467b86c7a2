import { Problem } from '../../../problems/problem.ts';
import { measureCellSize } from '../../../swath/measure-cell-size.ts';
import { createSwath, type Swath } from '../../../swath/swath.ts';
import { readNetcdfHeader } from '../../containers/netcdf-classic/read-netcdf-header.ts';
import { checkExtent } from '../../containers/netcdf-classic/read-variable.ts';
import { refuseOtherNetcdf } from '../../containers/netcdf-classic/sniff-netcdf.ts';
import type { ReadSwaths } from '../../read-swaths.ts';
import { applyFlags } from './apply-flags.ts';
import { type CfFile, tellProblem } from './cf-file.ts';
import { describeSource } from './describe-source.ts';
import { findVariables, type SwathVariables } from './find-variables.ts';
import { clearNeverLooked, readBackground, readFlagFields, readIceProbability } from './read-extras.ts';
import { readPositions } from './read-positions.ts';
import { fillMissingTimes, readTimes } from './read-times.ts';
import { readWinds } from './read-winds.ts';

/** More passes than any merged file has: a longer leading dimension is something else. */
const MOST_PASSES = 100;

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
  const swaths: Swath[] = [];
  checkExtent(bytes, header, variables.lat);
  // A merged file has several passes along a leading dimension.
  const [columns, rows, passes = 1] = variables.lat.dimensions.map(({ length }) => length).toReversed();
  if (passes > MOST_PASSES) {
    throw new Problem('not-a-swath', `A file of ${passes} passes is not a merged swath file.`, { file: fileName });
  }
  for (let pass = 0; pass < passes && rows * columns > 0; pass++) {
    const swath = readPass(file, variables, pass, rows, columns);
    if (swath) swaths.push(swath);
  }
  if (swaths.length === 0)
    tellProblem(file, new Problem('no-cells', 'The file holds no cells: nothing was looked at.'));
  return { format: `netCDF classic (CDF-${header.version})`, swaths, problems: file.problems };
}

/** One pass as a swath; null where no cell has a position. */
function readPass(file: CfFile, variables: SwathVariables, pass: number, rows: number, columns: number): Swath | null {
  const first = pass * rows * columns;
  const swath = createSwath(rows, columns);
  const looked = readPositions(file, variables, first, swath);
  if (looked === 0) return null;
  fillTimes(file, variables, first, swath);
  readWinds(file, variables.wind, first, swath);
  readBackground(file, variables, first, swath);
  readIceProbability(file, variables, first, swath);
  const fields = readFlagFields(file, variables, first, swath);
  if (looked < rows * columns) clearNeverLooked(swath);
  for (const doubt of applyFlags(swath, fields)) tellProblem(file, doubt);
  describeSource(swath, file.header, fields);
  if (Number.isNaN(swath.cellSizeM)) swath.cellSizeM = measureCellSize(swath);
  return swath;
}

function fillTimes(file: CfFile, variables: SwathVariables, first: number, swath: Swath): void {
  const place = { file: file.header.fileName };
  if (!variables.time) throw new Problem('not-a-swath', 'This file gives no time for its winds.', place);
  readTimes(file, variables.time, variables.lat.dimensions, first, swath.timeMs);
  const filled = fillMissingTimes(swath.timeMs, swath.state);
  if (filled < 0) throw new Problem('not-a-swath', 'None of the cells has a time.', place);
  if (filled > 0)
    swath.notes.push(`Cells without a time of their own, which took that of the cell next to them: ${filled}.`);
}
