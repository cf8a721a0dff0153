import { describe, expect, it } from 'vitest';
import { ownAddress, providerAddress } from './return-address.ts';

describe('the address to come back to', () => {
  it.each(['/month', '/explore?outcome=speed#grid', '/submissions/1/receipt'])('may be %s', (address) => {
    expect(ownAddress(address)).toBe(address);
  });

  it.each([
    '//elsewhere.example/x',
    '/\\elsewhere.example',
    'https://elsewhere.example',
    'javascript:alert(1)',
    'month',
    '/api/sign-out',
    '/\t/elsewhere.example',
  ])('is never %s', (address) => {
    expect(ownAddress(address)).toBe('/start');
  });

  it('is the start of the person’s work when nothing was asked for', () => {
    expect(ownAddress(null)).toBe('/start');
    expect(providerAddress('/start')).toBe('/api/sign-in?returnTo=%2Fstart');
  });
});
