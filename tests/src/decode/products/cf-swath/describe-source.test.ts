import { expect, test } from 'vitest';
import { SmallFile } from './small-swath.ts';

/** A small file with global attributes. */
function withGlobals(attributes: Record<string, string>): SmallFile {
  const file = new SmallFile();
  Object.assign(file.content.attributes, attributes);
  return file;
}

test('gives the source as the file has it, else its title, else nothing', () => {
  expect(withGlobals({ source: 'Ours', title: 'Winds' }).swath().sourceAsRead).toBe('Ours');
  expect(withGlobals({ title: 'Winds' }).swath().sourceAsRead).toBe('Winds');
  expect(withGlobals({}).swath().sourceAsRead).toBeNull();
});

test('believes the band that the title names', () => {
  const { band, viewing } = withGlobals({ title: 'Ku-band winds' }).swath();
  expect([band, viewing]).toEqual(['Ku', 'pencil-beam']);
});

test('claims no band where nothing speaks of it', () => {
  expect([withGlobals({}).swath().band, withGlobals({}).swath().viewing]).toEqual([null, null]);
});

test('reads the cell size with its unit, in kilometres or metres', () => {
  expect(withGlobals({ pixel_size_on_horizontal: '12.5 km' }).swath().cellSizeM).toBe(12_500);
  expect(withGlobals({ 'NC_GLOBAL.cell_spacing': '25000 m' }).swath().cellSizeM).toBe(25_000);
});

test('measures the cell size where the stated one has no unit', () => {
  // Cells one degree of longitude apart at 50 degrees north: 6371.0088 km x pi/180 x cos 50 = 71.47 km, less the chord's bulge.
  expect(withGlobals({ pixel_size: '25' }).swath().cellSizeM / 1000).toBeCloseTo(71.47, 1);
});
