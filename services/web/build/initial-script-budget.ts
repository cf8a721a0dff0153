/** Fails the build when a first visit would fetch more JavaScript than allowed. */
import { gzipSync } from 'node:zlib';
import type { Plugin } from 'vite';

/** `limit`: bytes, gzipped, of each entry together with every chunk it imports statically. */
export function initialScriptBudget(limit: number): Plugin {
  return {
    name: 'initial-script-budget',
    apply: 'build',
    generateBundle(_options, bundle) {
      const chunks = Object.values(bundle).filter((output) => output.type === 'chunk');
      const byName = new Map(chunks.map((chunk) => [chunk.fileName, chunk]));
      for (const entry of chunks.filter((chunk) => chunk.isEntry)) {
        const reached = new Set<string>();
        const waiting = [entry.fileName];
        for (let name = waiting.pop(); name !== undefined; name = waiting.pop()) {
          if (reached.has(name)) continue;
          reached.add(name);
          waiting.push(...(byName.get(name)?.imports ?? []));
        }
        const sizes = [...reached].map((name) => ({ name, bytes: gzipSync(byName.get(name)?.code ?? '').length }));
        const total = sizes.reduce((sum, { bytes }) => sum + bytes, 0);
        const listed = sizes.map(({ name, bytes }) => `  ${bytes} ${name}`).join('\n');
        if (total > limit)
          this.error(`Initial JavaScript is ${total} bytes gzipped, ${total - limit} over the limit of ${limit}:\n${listed}`);
        this.info(`initial JavaScript: ${total} of ${limit} bytes gzipped`);
      }
    },
  };
}
