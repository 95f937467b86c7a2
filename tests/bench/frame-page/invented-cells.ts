import { blockBytes, type DrawBlock, layOutBlock } from '../../../src/contract/packed-swath.ts';
import { bearingDeg, destination } from '../../../src/geometry/sphere.ts';

const COLUMNS = 42;
const ROWS_PER_BLOCK = 68;
const SPACING_KM = 25;
const INCLINATION_HEADING = 346;

/**
 * Blocks of so many cells, each with a wind: a pass of two beams of 21 cells, 25 km apart, that winds about the earth
 * from pole to pole. Winds from a fixed seed, speeds after a Rayleigh law of mean 8 m/s (common practice, no source).
 */
export function inventCells(count: number): DrawBlock[] {
  const random = seededRandom(20310117);
  const blocks: DrawBlock[] = [];
  const rows = Math.ceil(count / COLUMNS);
  let [lon, lat] = [0, -60];
  let heading = INCLINATION_HEADING;
  for (let firstRow = 0; firstRow < rows; firstRow += ROWS_PER_BLOCK) {
    const block = emptyBlock(blocks.length + 1, firstRow, Math.min(ROWS_PER_BLOCK, rows - firstRow));
    for (let row = 0; row < block.rows; row++) {
      fillRow(block, row, lon, lat, heading, random);
      const ahead = destination(lon, lat, heading, SPACING_KM);
      heading = (bearingDeg(ahead[0], ahead[1], lon, lat) + 180) % 360;
      [lon, lat] = ahead;
    }
    blocks.push(block);
  }
  return blocks;
}

function emptyBlock(blockId: number, firstRow: number, rows: number): DrawBlock {
  const buffer = new ArrayBuffer(blockBytes(rows * COLUMNS));
  return layOutBlock(buffer, 0, { blockId, passId: 1, firstRow, rows, columns: COLUMNS });
}

function fillRow(block: DrawBlock, row: number, lon: number, lat: number, heading: number, random: () => number): void {
  for (let column = 0; column < COLUMNS; column++) {
    const cell = row * COLUMNS + column;
    const acrossKm = (column < COLUMNS / 2 ? -862 : 346) + (column % (COLUMNS / 2)) * SPACING_KM;
    const [cellLon, cellLat] = destination(lon, lat, heading + 90, acrossKm);
    block.lonE5[cell] = Math.round(cellLon * 1e5);
    block.latE5[cell] = Math.round(cellLat * 1e5);
    block.timeS[cell] = 1_926_000_000 + block.firstRow + row;
    block.speedMs[cell] = 6.4 * Math.sqrt(-2 * Math.log(1 - random()));
    block.directionFrom[cell] = random() * 360;
    block.state[cell] = 2;
    block.halfSidesM.set(halfSides(heading), cell * 4);
  }
}

/** Half a cell along the track and half a cell across it, metres east and north. */
function halfSides(heading: number): [number, number, number, number] {
  const [east, north] = [Math.sin((heading * Math.PI) / 180), Math.cos((heading * Math.PI) / 180)];
  const half = (SPACING_KM * 1000) / 2;
  return [east * half, north * half, north * half, -east * half];
}

/** Numerical Recipes' quick generator (section 7.1): enough for a spread of winds. */
function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}
