/** Where the card stands on the chart. */
export type CardSide = 'right' | 'left' | 'bottom' | 'top';

/** How near a cell may come to the card before the card gives way, CSS pixels. */
const CLEAR_PX = 40;

/**
 * The side of the chart where a card does not cover its cell: right, else left, else (on a narrow chart) the half the cell
 * is not in. A cell out of view hinders nothing.
 */
export function sideForCard(
  cell: { x: number; y: number },
  chart: { width: number; height: number },
  cardWidth: number,
): CardSide {
  const isInView = cell.x >= 0 && cell.x <= chart.width && cell.y >= 0 && cell.y <= chart.height;
  if (!isInView || cell.x < chart.width - cardWidth - CLEAR_PX) return 'right';
  if (cell.x > cardWidth + CLEAR_PX) return 'left';
  return cell.y < chart.height / 2 ? 'bottom' : 'top';
}
