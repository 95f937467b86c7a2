import { encodeFanBeamBufr } from '../../../src/demo/encode-fan-beam-bufr.ts';
import { encodeNetcdf } from '../../../src/demo/encode-netcdf.ts';
import { createBeams, createSolutions } from '../../../src/swath/swath.ts';
import { drawSwath } from '../store/draw-swath.ts';

/**
 * A CF swath of two rows of three cells. Speeds in m/s, a dash where there is none:
 *
 *     17.2  17.3  10.7      blowing to 90, 90 and 0 degrees
 *      2.5    -   35        blowing to 180 and 270 degrees; the middle cell lies over land
 */
export function buildCfFile(): Uint8Array<ArrayBuffer> {
  const grid = ['row', 'cell'];
  const coordinates = 'lat lon';
  return encodeNetcdf({
    version: 1,
    dimensions: [
      { name: 'row', length: 2 },
      { name: 'cell', length: 3 },
    ],
    attributes: { Conventions: 'CF-1.6' },
    variables: [
      {
        name: 'time',
        type: 'int',
        dimensions: grid,
        attributes: { standard_name: 'time', units: 'seconds since 2031-01-17 00:00:00' },
        values: Int32Array.of(0, 0, 0, 4, 4, 4),
      },
      {
        name: 'lat',
        type: 'int',
        dimensions: grid,
        attributes: {
          standard_name: 'latitude',
          units: 'degrees_north',
          scale_factor: Float64Array.of(1e-5),
        },
        values: Int32Array.of(5_000_000, 5_000_000, 5_000_000, 5_022_500, 5_022_500, 5_022_500),
      },
      {
        name: 'lon',
        type: 'int',
        dimensions: grid,
        attributes: { standard_name: 'longitude', units: 'degrees_east', scale_factor: Float64Array.of(1e-5) },
        values: Int32Array.of(17_965_000, 18_000_000, 18_035_000, 17_965_000, 18_000_000, 18_035_000),
      },
      {
        name: 'wvc_quality_flag',
        type: 'int',
        dimensions: grid,
        attributes: {
          coordinates,
          flag_masks: Int32Array.of(2 ** 11, 2 ** 12, 2 ** 15),
          flag_meanings:
            'small_wind_less_than_or_equal_to_3_m_s large_wind_greater_than_30_m_s some_portion_of_wvc_is_over_land',
        },
        values: Int32Array.of(0, 0, 0, 2 ** 11, 2 ** 15, 2 ** 12),
      },
      {
        name: 'wind_speed',
        type: 'short',
        dimensions: grid,
        attributes: {
          standard_name: 'wind_speed',
          units: 'm s-1',
          scale_factor: Float64Array.of(0.01),
          _FillValue: Int16Array.of(-32767),
          coordinates,
        },
        values: Int16Array.of(1720, 1730, 1070, 250, -32767, 3500),
      },
      {
        name: 'wind_dir',
        type: 'short',
        dimensions: grid,
        attributes: {
          standard_name: 'wind_to_direction',
          units: 'degree',
          scale_factor: Float64Array.of(0.1),
          _FillValue: Int16Array.of(-32767),
          coordinates,
        },
        values: Int16Array.of(900, 900, 0, 1800, -32767, 2700),
      },
    ],
  });
}

/** A fan-beam swath of two rows of four cells, three of them with a second, reversed solution that was chosen. */
export function buildBufrFile(): Uint8Array<ArrayBuffer> {
  const swath = drawSwath(['1221', '1o21']);
  swath.solutions = createSolutions(8, 2);
  swath.beams = createBeams(8, 3);
  for (let cell = 0; cell < 8; cell++) {
    if (Number.isNaN(swath.speedMs[cell])) continue;
    const isSecond = cell < 3;
    swath.chosenSolution[cell] = isSecond ? 2 : 1;
    swath.solutions.speedMs.set([swath.speedMs[cell], isSecond ? swath.speedMs[cell] : Number.NaN], cell * 2);
    swath.solutions.directionFrom.set(isSecond ? [20, 200] : [200, Number.NaN], cell * 2);
    swath.solutions.probability.set(isSecond ? [0.5, 0.5] : [1, Number.NaN], cell * 2);
    swath.beams.incidenceDeg.set([45, 35, 45], cell * 3);
    swath.beams.backscatterDb.set([-15, -10, -15], cell * 3);
  }
  return new Uint8Array(encodeFanBeamBufr(swath, { platformCode: 990 }));
}
