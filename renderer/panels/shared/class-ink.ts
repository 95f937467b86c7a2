import { beaufortOfSpeed } from '../../../src/wind/beaufort.ts';
import { inkOfBeaufort } from '../../state/lights.ts';

/** The ink of a speed's class, as the stylesheets know it. */
export function inkOfSpeed(speedMs: number): string {
  return `var(--wind-${inkOfBeaufort[beaufortOfSpeed(speedMs)]})`;
}
