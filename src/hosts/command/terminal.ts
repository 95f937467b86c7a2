/** Where a command writes: results to stdout, progress and complaints to stderr. A process is one. */
export interface Terminal {
  stdout: { write(text: string): unknown };
  stderr: { write(text: string): unknown };
  /** Hears the user's interrupt. */
  once(event: 'SIGINT', listener: () => void): unknown;
  removeListener(event: 'SIGINT', listener: () => void): unknown;
}
