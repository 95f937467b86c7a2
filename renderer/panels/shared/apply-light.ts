import { type LightName, lights } from '../../state/lights.ts';

/** Gives a light's colours to the stylesheets, as custom properties on an element. */
export function applyLight(element: HTMLElement, name: LightName): void {
  const { windInks, ...colours } = lights[name];
  for (const [part, colour] of Object.entries(colours)) element.style.setProperty(`--${part}`, colour);
  windInks.forEach((ink, index) => {
    element.style.setProperty(`--wind-${index}`, ink);
  });
  element.dataset.light = name;
}
