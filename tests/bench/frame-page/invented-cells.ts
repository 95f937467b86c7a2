import { type DrawBlock, viewBlocks } from '../../../src/contract/packed-swath.ts';
import { bearingDeg, destination } from '../../../src/geometry/sphere.ts';
import { packBlock } from '../../../src/store/pack-block.ts';
import { measureFootprints } from '../../../src/swath/footprints.ts';
import { createSwath, type Swath, WIND } from '../../../src/swath/swath.ts';

const COLUMNS = 42;
const ROWS_PER_BLOCK = 68;
const SPACING_KM = 25;
const FIRST_HEADING = 346;
/** Kilometres from the track to the first cell of the left side and of the right side, left negative. */
const SIDES_KM = [-862, 362];

/**
 * Blocks of so many cells, each with a wind: a pass of two beams of 21 cells, 25 km apart, that winds about the earth
 * from pole to pole. Winds from a fixed seed, speeds after a Rayleigh law of mean 8 m/s (common practice, no source).
 */
export function inventPass(count: number): DrawBlock[] {
  const swath = createSwath(Math.ceil(count / COLUMNS), COLUMNS);
  swath.cellSizeM = SPACING_KM * 1000;
  fillPlaces(swath);
  fillWinds(swath);
  return packBlocks(swath);
}

/** The same winds strewn evenly over the map between 70 S and 70 N, so that no tile of the symbol layer overflows. */
export function scatterCells(count: number): DrawBlock[] {
  const random = seededRandom(20310118);
  const blocks = inventPass(count);
  for (const { lonE5, latE5, cells } of blocks) {
    for (let cell = 0; cell < cells; cell++) {
      lonE5[cell] = Math.round((random() - 0.5) * 360e5);
      latE5[cell] = Math.round((random() - 0.5) * 140e5);
    }
  }
  return blocks;
}

function fillPlaces(swath: Swath): void {
  let [lon, lat] = [0, -60];
  let heading = FIRST_HEADING;
  for (let row = 0; row < swath.rows; row++) {
    for (let column = 0; column < COLUMNS; column++) {
      const side = Math.floor(column / (COLUMNS / 2));
      const acrossKm = SIDES_KM[side] + (column % (COLUMNS / 2)) * SPACING_KM;
      const cell = row * COLUMNS + column;
      [swath.lon[cell], swath.lat[cell]] = destination(lon, lat, heading + 90, acrossKm);
    }
    const ahead = destination(lon, lat, heading, SPACING_KM);
    heading = (bearingDeg(ahead[0], ahead[1], lon, lat) + 180) % 360;
    [lon, lat] = ahead;
  }
}

function fillWinds(swath: Swath): void {
  const random = seededRandom(20310117);
  for (let cell = 0; cell < swath.rows * COLUMNS; cell++) {
    swath.state[cell] = WIND;
    swath.timeMs[cell] = Date.UTC(2031, 0, 17) + Math.floor(cell / COLUMNS) * 3750;
    swath.speedMs[cell] = 6.4 * Math.sqrt(-2 * Math.log(1 - random()));
    swath.directionFrom[cell] = random() * 360;
  }
}

function packBlocks(swath: Swath): DrawBlock[] {
  const { halfSidesM } = measureFootprints(swath);
  const blocks: DrawBlock[] = [];
  for (let firstRow = 0; firstRow < swath.rows; firstRow += ROWS_PER_BLOCK) {
    const rows = Math.min(ROWS_PER_BLOCK, swath.rows - firstRow);
    blocks.push(...viewBlocks(packBlock(swath, halfSidesM, firstRow, rows)));
  }
  return blocks;
}

/** Numerical Recipes' quick generator (section 7.1): enough for a spread of winds. */
function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}
