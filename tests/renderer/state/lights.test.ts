import { expect, test } from 'vitest';
import { type Light, type LightName, lights } from '../../../renderer/state/lights.ts';

/** Relative luminance of '#rrggbb' (WCAG 2.2, definition of relative luminance). */
function luminance(colour: string): number {
  const [r, g, b] = [1, 3, 5]
    .map((at) => Number.parseInt(colour.slice(at, at + 2), 16) / 255)
    .map((value) => (value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4));
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

/** Contrast ratio of two colours (WCAG 2.2, definition of contrast ratio). */
function contrast(a: string, b: string): number {
  const [low, high] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (high + 0.05) / (low + 0.05);
}

const eachLight = Object.entries(lights) as [LightName, Light][];

test('measures contrast as the standard does: black on white is 21 to 1', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10);
});

test.each(eachLight)('reads in the %s light: text reaches 4.5 to 1 on its paper (WCAG 2.2, 1.4.3)', (_, light) => {
  for (const text of [light.ink, light.soft, light.windInks[3], light.windInks[4]]) {
    expect(contrast(text, light.paper)).toBeGreaterThanOrEqual(4.5);
  }
});

test.each(eachLight)('shows in the %s light every wind ink and every control edge at 3 to 1 (1.4.11)', (_, light) => {
  for (const ink of light.windInks) expect(contrast(ink, light.sea)).toBeGreaterThanOrEqual(3);
  expect(contrast(light.edge, light.paper)).toBeGreaterThanOrEqual(3);
});

test.each(eachLight)('reads in grey in the %s light: each wind ink stands further from the sea', (_, light) => {
  const contrasts = light.windInks.map((ink) => contrast(ink, light.sea));
  expect(contrasts).toEqual([...contrasts].sort((a, b) => a - b));
});
