import { screen } from '@testing-library/react';
import { expect, it } from 'vitest';
import { renderPart } from '../testing/render.tsx';
import { Pagination } from './pagination.tsx';

const link = (name: string) => screen.queryByRole('link', { name })?.getAttribute('href');

it('links to the neighbouring pages and keeps the rest of the address', () => {
  renderPart(<Pagination label="Findings" page={2} pageSize={50} total={120} one="finding" />, '/?rule=E-12&page=2');
  expect(screen.getByRole('navigation', { name: 'Pages of Findings' }).textContent).toContain('51 to 100 of 120 findings, page 2 of 3');
  expect(link('Previous page')).toBe('/?rule=E-12');
  expect(link('Next page')).toBe('/?rule=E-12&page=3');
});

it('says only how many there are when they fit on one page', () => {
  renderPart(<Pagination label="Findings" page={1} pageSize={50} total={1} one="finding" />);
  expect(screen.getByRole('navigation').textContent).toBe('1 finding');
  expect(screen.queryByRole('link')).toBeNull();
});

it('leads back from a page beyond the last', () => {
  renderPart(<Pagination label="Findings" page={9} pageSize={50} total={120} one="finding" />, '/?page=9');
  expect(link('Previous page')).toBe('/?page=3');
  expect(link('Next page')).toBeUndefined();
});

it('comes to its own section of a page that holds more', () => {
  renderPart(<Pagination label="Findings" page={1} pageSize={50} total={120} one="finding" anchor="places" />);
  expect(link('Next page')).toBe('/?page=2#places');
});
