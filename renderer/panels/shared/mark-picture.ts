import { draw } from './make.ts';

/** The marks of the chart that are not barbs. */
export type MarkName = 'unseen' | 'noWind' | 'land' | 'quality' | 'rain' | 'ice' | 'calm' | 'noDirection' | 'hidden';

const SIZE_PX = 14;

/** A mark as keys show it, drawn like the chart's own. */
export function markPicture(name: MarkName): SVGSVGElement {
  return draw(
    'svg',
    { class: `mark mark-${name}`, viewBox: '-7 -7 14 14', width: SIZE_PX, height: SIZE_PX, 'aria-hidden': 'true' },
    ...drawMark(name),
  );
}

function drawMark(name: MarkName): SVGElement[] {
  const stroke = { fill: 'none', stroke: 'currentColor', 'stroke-width': 1.3 };
  switch (name) {
    case 'unseen':
      return [
        draw('rect', { x: -7, y: -7, width: 14, height: 14, fill: 'var(--unseen)' }),
        draw('path', { d: 'M -7 0 L 0 -7 M -7 7 L 7 -7 M 0 7 L 7 0', fill: 'none', stroke: 'var(--hatch)' }),
      ];
    case 'noWind':
      return [
        draw('rect', { x: -7, y: -7, width: 14, height: 14, fill: 'var(--sea)' }),
        ...[-4.5, 0, 4.5].flatMap((x) =>
          [-4.5, 0, 4.5].map((y) => draw('circle', { cx: x, cy: y, r: 0.9, fill: 'var(--hatch)' })),
        ),
      ];
    case 'land':
      return [draw('rect', { x: -3.5, y: -3.5, width: 7, height: 7, ...stroke })];
    case 'quality':
      return [draw('path', { d: 'M -3.5 -3.5 L 3.5 3.5 M -3.5 3.5 L 3.5 -3.5', ...stroke })];
    case 'rain':
      return [draw('circle', { r: 4.5, ...stroke })];
    case 'ice':
      return [draw('path', { d: 'M 0 -4.8 L 4.8 3.6 H -4.8 Z', ...stroke })];
    case 'calm':
      return [draw('circle', { r: 3, ...stroke, stroke: 'var(--wind-0)' })];
    case 'noDirection':
      return [draw('path', { d: 'M 0 -4.5 L 4.5 0 L 0 4.5 L -4.5 0 Z', ...stroke })];
    case 'hidden':
      return [draw('circle', { r: 1.6, fill: 'currentColor' })];
  }
}
