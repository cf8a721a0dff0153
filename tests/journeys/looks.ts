/** Looks at a page as people meet it: narrow and wide, light and dark. Keeps a picture of each, and finds what shuts people out. */
import { fileURLToPath } from 'node:url';
import AxeBuilder from '@axe-core/playwright';
import { expect } from '@playwright/test';
import type { Page } from '@playwright/test';

const folder = fileURLToPath(new URL('screenshots/', import.meta.url));
const schemes = ['light', 'dark'] as const;
const sizes = [
  { width: 320, height: 640 },
  { width: 1440, height: 900 },
] as const;

/**
 * Pictures `<name>-<scheme>-<width>.png`; fails on any violation that axe finds and on a page wider than its screen. The
 * window is as before afterwards, in the light scheme.
 */
export async function look(page: Page, name: string): Promise<void> {
  const before = page.viewportSize();
  // A page that is still being fetched has nothing to look at.
  await page.getByRole('heading', { level: 1 }).first().waitFor();
  for (const scheme of schemes) {
    await page.emulateMedia({ colorScheme: scheme });
    for (const size of sizes) {
      await page.setViewportSize(size);
      await drawn(page);
      expect(await violationsOn(page), `${name}, ${scheme}, ${size.width} px`).toEqual([]);
      const excess = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
      expect(excess, `${name} at ${size.width} px is wider than the screen`).toBeLessThanOrEqual(0);
      await page.screenshot({ path: `${folder}${name}-${scheme}-${size.width}.png`, fullPage: true });
    }
  }
  await page.emulateMedia({ colorScheme: 'light' });
  if (before !== null) await page.setViewportSize(before);
}

async function violationsOn(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  return violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`);
}

/** A new scheme or size is drawn, and whatever it set in motion has come to rest. */
async function drawn(page: Page): Promise<void> {
  do {
    await page.evaluate(() => new Promise((done) => requestAnimationFrame(() => requestAnimationFrame(done))));
  } while ((await settled(page)) > 0);
}

/**
 * Waits for what is moving, and says how much it was. One that is cancelled has come to rest as well, and so has a stone that stays
 * where its fall has put it.
 */
const settled = (page: Page): Promise<number> =>
  page.evaluate(async () => {
    const moving = document.getAnimations().filter(({ playState }) => playState === 'running');
    return (await Promise.allSettled(moving.map(({ finished }) => finished))).length;
  });
