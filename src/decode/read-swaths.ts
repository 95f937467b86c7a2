import type { Problem } from '../problems/problem.ts';
import type { Swath } from '../swath/swath.ts';

/** What a file's bytes turned out to be. A damaged part is told in `problems`, beside what could still be read. */
export interface ReadSwaths {
  /** In plain words: 'BUFR edition 4', 'netCDF classic (CDF-1)'. */
  format: string;
  swaths: Swath[];
  problems: Problem[];
}
