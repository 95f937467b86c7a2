import type { NetcdfArray, NetcdfValue } from '../../../../../src/decode/containers/netcdf-classic/netcdf-types.ts';
import { readCfSwaths } from '../../../../../src/decode/products/cf-swath/read-cf-swaths.ts';
import type { ReadSwaths } from '../../../../../src/decode/read-swaths.ts';
import { encodeNetcdf, type NetcdfContent, type NetcdfContentVariable } from '../../../../../src/demo/encode-netcdf.ts';
import type { Problem } from '../../../../../src/problems/problem.ts';
import type { Swath } from '../../../../../src/swath/swath.ts';
import { type FlagName, listFlags } from '../../../../../src/wind/flags.ts';

/** A swath file of 1 row of 3 cells in plain numbers, to be changed by a test before it is written. */
export class SmallFile {
  readonly content: NetcdfContent = {
    version: 1,
    dimensions: [
      { name: 'row', length: 1 },
      { name: 'cell', length: 3 },
    ],
    attributes: {},
    variables: [
      variable('time', 'double', Float64Array.of(0, 0, 0), { units: 'seconds since 2031-01-17' }),
      variable('lat', 'double', Float64Array.of(50, 50, 50), { units: 'degrees_north' }),
      variable('lon', 'double', Float64Array.of(10, 11, 12), { units: 'degrees_east' }),
      variable('wind_speed', 'float', Float32Array.of(10, 11, 12), { standard_name: 'wind_speed', units: 'm s-1' }),
      variable('wind_dir', 'float', Float32Array.of(90, 180, 270), {
        standard_name: 'wind_from_direction',
        units: 'degree',
      }),
    ],
  };

  /** The variable of a name. */
  get(name: string): NetcdfContentVariable {
    const found = this.content.variables.find((candidate) => candidate.name === name);
    if (!found) throw new Error(`no ${name}`);
    return found;
  }

  /** Sets attributes of a variable. */
  describe(name: string, attributes: Record<string, NetcdfValue>): this {
    Object.assign(this.get(name).attributes, attributes);
    return this;
  }

  /** Gives a variable a type and values. */
  fill(name: string, type: NetcdfContentVariable['type'], values: NetcdfArray): this {
    Object.assign(this.get(name), { type, values });
    return this;
  }

  /** Adds a variable, by default at the end. */
  add(added: NetcdfContentVariable, isFirst = false): this {
    if (isFirst) this.content.variables.unshift(added);
    else this.content.variables.push(added);
    return this;
  }

  remove(...names: string[]): this {
    this.content.variables = this.content.variables.filter(({ name }) => !names.includes(name));
    return this;
  }

  bytes(): Uint8Array<ArrayBuffer> {
    return encodeNetcdf(this.content);
  }

  read(): ReadSwaths {
    return readCfSwaths(this.bytes(), 'small.nc');
  }

  /** Its only swath. */
  swath(): Swath {
    const { swaths } = this.read();
    if (swaths.length !== 1) throw new Error(`${swaths.length} swaths`);
    return swaths[0];
  }

  /** The Problem that reading it throws. */
  refusal(): Problem {
    try {
      this.read();
    } catch (thrown) {
      return thrown as Problem;
    }
    throw new Error('it was read');
  }
}

/** A variable of the small file's cells. */
export function variable(
  name: string,
  type: NetcdfContentVariable['type'],
  values: NetcdfArray,
  attributes: Record<string, NetcdfValue> = {},
): NetcdfContentVariable {
  return { name, type, dimensions: ['row', 'cell'], attributes, values };
}

/** The flags of each cell by name. */
export function flagsOf(swath: Swath): FlagName[][] {
  return Array.from(swath.flags, listFlags);
}
