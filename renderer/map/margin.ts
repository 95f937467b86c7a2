import { type EdgeLabel, edgeLabels, graticuleStep } from './graticule.ts';
import { scaleBar } from './scale-bar.ts';
import type { View } from './view.ts';

const LONGEST_BAR_PX = 120;

/** The names of the graticule's lines along the edges of the chart, and its scale bar; drawn anew for each view. */
export function drawMargin(container: HTMLElement): { draw(view: View): void; remove(): void } {
  const margin = document.createElement('div');
  margin.className = 'chart-margin';
  margin.ariaHidden = 'true';
  const bar = document.createElement('div');
  bar.className = 'chart-scale';
  margin.append(bar);
  container.append(margin);
  const spans: HTMLElement[] = [];

  function spanAt(index: number): HTMLElement {
    if (!spans[index]) {
      spans[index] = document.createElement('span');
      margin.append(spans[index]);
    }
    return spans[index];
  }

  return {
    draw(view) {
      const labels = edgeLabels(view, graticuleStep(view.zoom)).filter((label) => isClearOfCorner(label));
      labels.forEach((label, index) => {
        const span = spanAt(index);
        span.textContent = label.text;
        span.className = `chart-line-name at-${label.edge}`;
        span.style.transform =
          label.edge === 'top'
            ? `translate(${label.atPx.toFixed(1)}px, 0)`
            : `translate(0, ${label.atPx.toFixed(1)}px)`;
      });
      for (const span of spans.splice(labels.length)) span.remove();
      const { nauticalMiles, lengthPx } = scaleBar(view, LONGEST_BAR_PX);
      bar.textContent = `${nauticalMiles} NM`;
      bar.style.width = `${lengthPx.toFixed(1)}px`;
    },
    remove() {
      margin.remove();
    },
  };
}

/** Names at the very corner would stand on one another. */
function isClearOfCorner(label: EdgeLabel): boolean {
  return label.atPx > (label.edge === 'left' ? 34 : 8);
}
