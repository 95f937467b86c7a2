import type { BitReader } from '../../../bytes/bit-reader.ts';
import type { Column, DataBlock } from '../../containers/bufr/lay-out-data.ts';
import { readExactNumbers } from '../../containers/bufr/read-column.ts';

/** One radar look of a cell. */
export interface LookColumns {
  incidence: Column | undefined;
  azimuth: Column | undefined;
  backscatter: Column | undefined;
  noise: Column | undefined;
}

/** One possible wind of a cell. */
export interface SolutionColumns {
  speed: Column | undefined;
  direction: Column | undefined;
  fitDistance: Column | undefined;
  likelihood: Column | undefined;
}

/** The elements of a block that a cell of a swath is made of; undefined where the block has none. */
export interface CellColumns {
  platform: Column | undefined;
  /** Year, month, day, hour, minute, second. */
  time: (Column | undefined)[];
  lat: Column | undefined;
  lon: Column | undefined;
  rowNumber: Column | undefined;
  cellNumber: Column | undefined;
  cellSize: Column | undefined;
  flagWord: Column | undefined;
  selected: Column | undefined;
  backgroundSpeed: Column | undefined;
  backgroundDirection: Column | undefined;
  iceProbability: Column | undefined;
  looks: LookColumns[];
  solutions: SolutionColumns[];
}

/**
 * Picks out, by element and by place, what a cell is made of. Elements repeat with other meanings further on (the land
 * part has backscatters of its own, a time difference is in seconds again): the first ones belong to the cell.
 * Element numbers: WMO-No. 306, FM 94 table B.
 */
export function findCellColumns(reader: BitReader, block: DataBlock): CellColumns {
  const byDescriptor = Map.groupBy(block.columns, (column) => column.element.descriptor);
  const all = (...descriptors: number[]) => descriptors.flatMap((descriptor) => byDescriptor.get(descriptor) ?? []);
  const first = (...descriptors: number[]): Column | undefined => all(...descriptors)[0];
  return {
    platform: first(1007),
    time: [first(4001), first(4002), first(4003), first(4004), first(4005), first(4006)],
    lat: first(5001, 5002),
    lon: first(6001, 6002),
    rowNumber: first(5034),
    cellNumber: first(6034),
    cellSize: first(5033, 2026),
    flagWord: first(21155, 21109, 33055),
    selected: first(21102),
    backgroundSpeed: first(11082),
    backgroundDirection: first(11081),
    iceProbability: first(20095),
    looks: findLooks(all),
    solutions: findSolutions(all, (column) => isMissingThroughout(reader, column)),
  };
}

type FindAll = (...descriptors: number[]) => Column[];

function findLooks(all: FindAll): LookColumns[] {
  const [incidences, azimuths, noises] = [all(2111), all(2134), all(21063)];
  const backscatters = all(21062, 21105, 21123);
  return incidences.map((incidence, n) => ({
    incidence,
    azimuth: azimuths[n],
    backscatter: backscatters[n],
    noise: noises[n],
  }));
}

/** The slots up to the last that holds a wind anywhere: files keep room for solutions they do not use. */
function findSolutions(all: FindAll, isEmpty: (column: Column) => boolean): SolutionColumns[] {
  const [speeds, directions, fitDistances, likelihoods] = [all(11012), all(11011), all(21156), all(21104)];
  const used = speeds.findLastIndex((speed) => !isEmpty(speed)) + 1;
  return speeds.slice(0, used).map((speed, n) => ({
    speed,
    direction: directions[n],
    fitDistance: fitDistances[n],
    likelihood: likelihoods[n],
  }));
}

function isMissingThroughout(reader: BitReader, column: Column): boolean {
  if (column.strideBits !== 0) return false;
  const value = new Float64Array(1);
  readExactNumbers(reader, column, 1, value);
  return Number.isNaN(value[0]);
}
