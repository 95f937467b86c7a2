import { measureCoverage } from '../analyse/coverage/coverage.ts';
import { countWatch } from '../analyse/watch/watch.ts';
import { writeWatchLine } from '../brief/watch-line.ts';
import type { OperationAnswer, OperationInput } from '../contract/operations.ts';
import type { DrawBlock } from '../contract/packed-swath.ts';
import type { Archive } from '../store/archive.ts';
import { findBlocks } from '../store/blocks.ts';
import type { SeenBlock } from '../swath/seen-block.ts';
import { isHiddenBySwitches } from '../wind/switches.ts';
import { createBlockCache } from './block-cache.ts';
import type { Coastline } from './coastline.ts';
import { isCellInWater, layWater, type Water } from './watch-water.ts';

type Input = OperationInput<'readWatch'>;
type Answer = OperationAnswer<'readWatch'>;

/** Answers the watch: what was seen in the water asked about, what was not, and the sentence that says so. */
export function createWatchReader(archive: Archive, coastline: Coastline): (input: Input) => Answer {
  const readCached = createBlockCache(archive);
  let last: { asked: string; water: Water } | undefined;
  return (input) => {
    const asked = JSON.stringify(input.water);
    if (last?.asked !== asked || input.water.kind === 'area')
      last = { asked, water: layWater(archive, coastline, input.water) };
    return report(input, last.water, readCached(findBlocks(archive, last.water.box, input.window)));
  };
}

function report(input: Input, water: Water, blocks: DrawBlock[]): Answer {
  const fromS = input.window.fromMs / 1000;
  const toS = input.window.toMs / 1000;
  const hiddenPasses = new Set(input.hiddenPassIds);
  const isInWindow = (block: SeenBlock, cell: number) => block.timeS[cell] >= fromS && block.timeS[cell] <= toS;
  const isHidden = (block: SeenBlock, cell: number) =>
    hiddenPasses.has(block.passId) || isHiddenBySwitches(block.speedMs[cell], block.flags[cell], input.switches);

  const coverage = measureCoverage(water.grid, water.isSea, blocks, isInWindow);
  const figures = countWatch(
    blocks,
    (block, cell) => isInWindow(block, cell) && isCellInWater(water, block, cell),
    isHidden,
  );
  const runs = writeWatchLine({
    ...figures,
    ...coverage,
    areaName: water.areaName,
    hiddenPasses: [...coverage.seenShareOfPass.keys()].filter((passId) => hiddenPasses.has(passId)).length,
    window: input.window,
    nowMs: input.nowMs,
    speedUnit: input.speedUnit,
  });
  return {
    runs,
    ...figures,
    seaKm2: coverage.seaKm2,
    unseenShare: Number.isNaN(coverage.unseenShare) ? null : coverage.unseenShare,
    noWindShare: Number.isNaN(coverage.noWindShare) ? 0 : coverage.noWindShare,
    passes: sharesOfPasses(blocks, coverage.seenShareOfPass, isInWindow),
  };
}

function sharesOfPasses(
  blocks: DrawBlock[],
  shares: Map<number, number>,
  isCounted: (block: SeenBlock, cell: number) => boolean,
): Answer['passes'] {
  const spans = new Map<number, { startMs: number; endMs: number }>();
  for (const block of blocks) {
    if (!shares.get(block.passId)) continue;
    const span = spans.get(block.passId) ?? { startMs: Number.POSITIVE_INFINITY, endMs: Number.NEGATIVE_INFINITY };
    for (let cell = 0; cell < block.cells; cell++) {
      if (block.state[cell] === 0 || !isCounted(block, cell)) continue;
      span.startMs = Math.min(span.startMs, block.timeS[cell] * 1000);
      span.endMs = Math.max(span.endMs, block.timeS[cell] * 1000);
    }
    spans.set(block.passId, span);
  }
  return [...spans]
    .map(([passId, span]) => ({ passId, seenShare: shares.get(passId) ?? 0, ...span }))
    .sort((one, other) => other.endMs - one.endMs);
}
