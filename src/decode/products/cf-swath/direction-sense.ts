import type { NetcdfHeader, NetcdfVariable } from '../../containers/netcdf-classic/read-netcdf-header.ts';
import { globalText, textAttribute } from './cf-file.ts';

/** Which way a direction points: where the wind comes from, or where it blows to. */
export type DirectionSense = 'from' | 'to' | 'unknown';

/**
 * What the file says about which way a direction variable points: its CF standard name, else a plain statement in its
 * own text, else one in the file's comment. Anything less is unknown: a guess would turn every barb round.
 */
export function readDirectionSense(header: NetcdfHeader, variable: NetcdfVariable): DirectionSense {
  const standardName = textAttribute(variable.attributes, 'standard_name');
  if (standardName === 'wind_from_direction') return 'from';
  if (standardName === 'wind_to_direction') return 'to';
  const own = ['long_name', 'comment', 'description']
    .map((name) => textAttribute(variable.attributes, name))
    .join('. ');
  const stated = senseOfText(own);
  return stated !== 'unknown' ? stated : senseOfText(globalText(header, 'comment'));
}

/** Common practice: the meteorological convention is 'from', the oceanographic one 'to'. Text that says both says nothing. */
function senseOfText(text: string): DirectionSense {
  const saysFrom = /\bmeteorological convention\b|\bdirection from which\b|\bcom(es|ing) from\b/i.test(text);
  const saysTo =
    /\boceanographic convention\b|\bdirection (to|toward|towards) which\b|\bflowing (to|toward|towards|north)\b/i.test(
      text,
    );
  if (saysFrom === saysTo) return 'unknown';
  return saysFrom ? 'from' : 'to';
}
