/**
 * React Aria carries its few built-in phrases in some thirty languages and bundlers keep them all. The client speaks
 * English only (`I18nProvider locale="en-GB"`), so the other languages are replaced by empty modules.
 */
import type { Plugin } from 'vite';

const otherLanguage = /[\\/]react-(?:aria|stately)(?:-components)?[\\/].*[\\/]intl[\\/].*[\\/](?!en-)[a-z]{2}-[A-Z]{2}\.m?js$/;

export function englishOnly(): Plugin {
  return {
    name: 'english-only',
    enforce: 'pre',
    apply: 'build',
    load(id) {
      return otherLanguage.test(id) ? 'export default {};' : null;
    },
  };
}
