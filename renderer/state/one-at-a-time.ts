/**
 * Makes of some work a call that never runs twice at once: calls that come while it runs lead to one more run, a rest
 * after it. A folder of files tells of each; the lists they change are read a few times, not once for each.
 */
export function oneAtATime(work: () => Promise<unknown>, restMs: number): () => void {
  let isRunning = false;
  let isWanted = false;
  async function run(): Promise<void> {
    isRunning = true;
    while (isWanted) {
      isWanted = false;
      await work();
      await new Promise((resolve) => setTimeout(resolve, restMs));
    }
    isRunning = false;
  }
  return () => {
    isWanted = true;
    if (!isRunning) void run();
  };
}
