import type { Swath } from '../../../swath/swath.ts';
import type { NetcdfHeader } from '../../containers/netcdf-classic/read-netcdf-header.ts';
import { globalText } from './cf-file.ts';
import type { FlagField } from './read-flag-field.ts';

/** Says on a swath where it comes from, as far as the file tells: source, band and viewing, stated cell size. */
export function describeSource(swath: Swath, header: NetcdfHeader, fields: FlagField[]): void {
  const source = globalText(header, 'source');
  const title = globalText(header, 'title');
  swath.sourceAsRead = source || title || null;
  swath.cellSizeM = statedCellSizeM(header);
  setBand(swath, `${title} ${source}`, fields);
}

/** The band stands in the title or source, else the file's flag words tell their family. */
function setBand(swath: Swath, text: string, fields: FlagField[]): void {
  const families = new Set(fields.flatMap(({ meanings }) => meanings ?? []).map(({ family }) => family));
  const band = /\bKu[- ]?band\b/i.test(text) ? 'Ku' : /\bC[- ]?band\b/i.test(text) ? 'C' : null;
  if (band) swath.band = band;
  else if (families.has('ku-band') !== families.has('c-band')) {
    swath.band = families.has('ku-band') ? 'Ku' : 'C';
    swath.notes.push(`The radar band (${swath.band}) is taken from the words of the file's flags.`);
  }
  if (swath.band) swath.viewing = swath.band === 'Ku' ? 'pencil-beam' : 'fan-beam';
}

/** The cell spacing from a global attribute that speaks of it and gives a number with its unit; NaN where none does. */
function statedCellSizeM(header: NetcdfHeader): number {
  for (const name of header.attributes.keys()) {
    if (!/pixel_?size|cell_?(size|spacing)|grid_?spacing/i.test(name)) continue;
    const stated = /^([\d.]+)\s*(km|m|kilomet(?:re|er)s?|met(?:re|er)s?)\b/i.exec(globalText(header, name));
    if (stated) return Number(stated[1]) * (stated[2].toLowerCase().startsWith('k') ? 1000 : 1);
  }
  return Number.NaN;
}
