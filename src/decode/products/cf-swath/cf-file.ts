import type { Problem } from '../../../problems/problem.ts';
import type { NetcdfValue } from '../../containers/netcdf-classic/netcdf-types.ts';
import type { NetcdfHeader } from '../../containers/netcdf-classic/read-netcdf-header.ts';

/** A file being read, with what has been found amiss in it so far. */
export interface CfFile {
  bytes: Uint8Array;
  header: NetcdfHeader;
  problems: Problem[];
}

/** Adds a problem to the file's own, once: several passes of a merged file may run into the same one. */
export function tellProblem(file: CfFile, problem: Problem): void {
  const placed = problem.at({ file: file.header.fileName });
  const isTold = file.problems.some(
    ({ message, place }) => message === placed.message && place.part === placed.place.part,
  );
  if (!isTold) file.problems.push(placed);
}

type Attributes = Map<string, NetcdfValue>;

/** A text attribute, trimmed; empty where there is none. */
export function textAttribute(attributes: Attributes, name: string): string {
  const value = attributes.get(name);
  return typeof value === 'string' ? value.trim() : '';
}

/** A global text attribute; re-served copies may put 'NC_GLOBAL.' before its name. */
export function globalText(header: NetcdfHeader, name: string): string {
  return textAttribute(header.attributes, name) || textAttribute(header.attributes, `NC_GLOBAL.${name}`);
}

/** The numbers of an attribute, also where they were written as text; empty where there are none. */
export function numberAttribute(attributes: Attributes, name: string): number[] {
  const value = attributes.get(name);
  if (value === undefined) return [];
  const numbers = typeof value === 'string' ? value.trim().split(/[\s,]+/) : value;
  return Array.from(numbers as ArrayLike<string | number | bigint>, Number);
}
