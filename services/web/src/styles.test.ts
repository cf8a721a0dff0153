/// <reference types="node" />
// @vitest-environment node
/** The colours of styles.css, read from the file itself. */
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { contrast, dichromacies, linear, luminance, seenWith } from './testing/contrast.ts';

const css = readFileSync(new URL('./styles.css', import.meta.url), 'utf8');
const tokens = new Map(
  [...css.matchAll(/--color-([a-z-]+): light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\);/g)].map(([, name, light, dark]) => [
    name ?? '',
    { light: light ?? '', dark: dark ?? '' },
  ]),
);
const themes = ['light', 'dark'] as const;

function colour(name: string, theme: (typeof themes)[number]): string {
  const token = tokens.get(name);
  if (token === undefined) throw new Error(`styles.css has no colour named ${name}`);
  return token[theme];
}

describe('contrast', () => {
  it('is measured as WCAG defines it', () => {
    // Extremes as the definition states them; #767676 is the lightest grey that passes 4.5:1 on white.
    expect(contrast(linear('#000000'), linear('#ffffff'))).toBeCloseTo(21, 10);
    expect(contrast(linear('#767676'), linear('#ffffff'))).toBeGreaterThanOrEqual(4.5);
    expect(contrast(linear('#777777'), linear('#ffffff'))).toBeLessThan(4.5);
  });

  const surfaces = ['paper', 'sheet', 'chosen'];
  const words = ['ink', 'quiet', 'lichen', 'lake', 'amber', 'oxide'];
  const filled = ['lichen', 'oxide', 'ink'];

  describe.each(themes)('in the %s theme', (theme) => {
    it.each(surfaces.flatMap((surface) => words.map((word) => [word, surface] as const)))(
      'lets %s be read on %s (4.5 to 1)',
      (word, surface) => {
        expect(contrast(linear(colour(word, theme)), linear(colour(surface, theme)))).toBeGreaterThanOrEqual(4.5);
      },
    );

    it.each(filled)('lets a label in the colour of the sheet be read on a button filled with %s (4.5 to 1)', (fill) => {
      expect(contrast(linear(colour('sheet', theme)), linear(colour(fill, theme)))).toBeGreaterThanOrEqual(4.5);
    });

    it.each(surfaces)('sets outlines, bars and focus rings off from %s (3 to 1)', (surface) => {
      for (const line of ['edge', 'lichen', 'lake', 'oxide', 'amber']) {
        expect(contrast(linear(colour(line, theme)), linear(colour(surface, theme)))).toBeGreaterThanOrEqual(3);
      }
    });

    it.each([['full colour vision', null], ...Object.entries(dichromacies)] as const)(
      'orders AIS A to E by lightness with %s',
      (_name, matrix) => {
        const seen = ['ais-a', 'ais-b', 'ais-c', 'ais-d', 'ais-e'].map((name) => {
          const full = linear(colour(name, theme));
          return matrix === null ? full : seenWith(matrix, full);
        });
        const light = seen.map(luminance);
        const ordered = [...light].sort((a, b) => (theme === 'light' ? b - a : a - b));
        expect(light).toEqual(ordered);
        for (const [index, next] of seen.slice(1).entries()) {
          expect(contrast(seen[index] ?? next, next)).toBeGreaterThanOrEqual(1.25);
        }
      },
    );
  });
});
