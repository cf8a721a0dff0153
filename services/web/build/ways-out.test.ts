import { describe, expect, it } from 'vitest';
import { ways } from './ways-out.ts';

describe('ways', () => {
  it.each([
    ['fetch("/a")', 'fetch'],
    ['const f=self.fetch;f("/a")', 'fetch'],
    ['new XMLHttpRequest', 'XMLHttpRequest'],
    ['navigator.sendBeacon(a,b)', 'sendBeacon'],
    ['document.cookie="a=b"', 'cookie'],
    ['localStorage.a=1', 'localStorage'],
    ['window["indexedDB"].open("a")', 'indexedDB'],
    ['window.open("//a")', 'open('],
    ['await import(a)', 'import('],
  ])('finds the way out in %s', (code, way) => {
    expect(ways(code)).toEqual([way]);
  });

  it.each(['prefetchDNS(a)', 'dialog.open()', 'const cookies=1', 'import.meta.url', 'a.$fetch', 'reimport(a)'])(
    'finds none in %s',
    (code) => {
      expect(ways(code)).toEqual([]);
    },
  );
});
