import type { Page } from '@playwright/test';

/** The share of a patch of the screen that is near a colour '#rrggbb', 0 to 1. */
export async function shareOfColour(
  page: Page,
  middle: { x: number; y: number },
  sidePx: number,
  colour: string,
): Promise<number> {
  const clip = { x: middle.x - sidePx / 2, y: middle.y - sidePx / 2, width: sidePx, height: sidePx };
  const picture = (await page.screenshot({ clip })).toString('base64');
  return page.evaluate(
    async ([data, wanted]) => {
      const bytes = Uint8Array.from(atob(data), (character) => character.charCodeAt(0));
      const bitmap = await createImageBitmap(new Blob([bytes], { type: 'image/png' }));
      const canvas = new OffscreenCanvas(bitmap.width, bitmap.height);
      const context = canvas.getContext('2d') as OffscreenCanvasRenderingContext2D;
      context.drawImage(bitmap, 0, 0);
      const pixels = context.getImageData(0, 0, bitmap.width, bitmap.height).data;
      const [r, g, b] = [1, 3, 5].map((at) => Number.parseInt(wanted.slice(at, at + 2), 16));
      let near = 0;
      for (let i = 0; i < pixels.length; i += 4) {
        const distance = Math.abs(pixels[i] - r) + Math.abs(pixels[i + 1] - g) + Math.abs(pixels[i + 2] - b);
        if (distance <= 12) near++;
      }
      return near / (pixels.length / 4);
    },
    [picture, colour],
  );
}
