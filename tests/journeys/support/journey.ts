/** A journey's test: as any browser test, and it fails when a page complains in the console. */
import { expect, test as base } from '@playwright/test';
import type { BrowserContext, ConsoleMessage } from '@playwright/test';

export { expect };

/** The browser itself tells of each refusal that a page asked for and shows in words. */
const isRefusal = (message: ConsoleMessage): boolean =>
  message.text().startsWith('Failed to load resource') && new URL(message.location().url).pathname.startsWith('/api/');

/** `listen`: also to the pages of another browser window that the journey opens. */
export const test = base.extend<{ readonly listen: (context: BrowserContext) => void }>({
  listen: [
    async ({ context }, use) => {
      const complaints: string[] = [];
      const listen = (to: BrowserContext) => {
        to.on('weberror', (error) => complaints.push(error.error().message));
        to.on('console', (message) => {
          if (['error', 'warning'].includes(message.type()) && !isRefusal(message)) complaints.push(message.text());
        });
      };
      listen(context);
      await use(listen);
      expect(complaints, 'what pages said in the console').toEqual([]);
    },
    { auto: true },
  ],
});
