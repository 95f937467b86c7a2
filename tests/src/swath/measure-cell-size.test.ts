import { expect, test } from 'vitest';
import { measureCellSize } from '../../../src/swath/measure-cell-size.ts';
import { createSwath, LOOKED_NO_WIND } from '../../../src/swath/swath.ts';

/** A swath on the equator whose rows have these longitudes; NaN was never looked at. */
function onEquator(rows: number, lons: number[]) {
  const swath = createSwath(rows, lons.length);
  for (let cell = 0; cell < swath.state.length; cell++) {
    const lon = lons[cell % lons.length];
    if (Number.isNaN(lon)) continue;
    swath.state[cell] = LOOKED_NO_WIND;
    swath.lon[cell] = lon;
    swath.lat[cell] = 0;
  }
  return swath;
}

// One degree of the mean earth: 6371.0088 km x pi / 180 = 111.195 km.
test('gives the distance of neighbours and not that of the nadir gap', () => {
  expect(measureCellSize(onEquator(4, [0, 1, 2, 9, 10, 11])) / 1000).toBeCloseTo(111.195, 2);
});

test('measures across the date line', () => {
  expect(measureCellSize(onEquator(1, [179, -180, -179])) / 1000).toBeCloseTo(111.195, 2);
});

test('looks only at neighbours in one row that were both looked at', () => {
  expect(measureCellSize(onEquator(2, [0, Number.NaN, 5]))).toBeNaN();
});

test('measures a whole orbit by a sample', () => {
  const lons = Array.from({ length: 42 }, (_, column) => column * 0.25 + (column > 20 ? 7 : 0));
  expect(measureCellSize(onEquator(1632, lons)) / 1000).toBeCloseTo(27.799, 2);
});
