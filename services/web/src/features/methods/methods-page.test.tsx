import { purposes } from '@cairnstep/consent';
import { levelGroups, openReadings } from '@cairnstep/scoring';
import { evidenceTable, methodPages } from '@cairnstep/statistics';
import { act, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { renderRoutes } from '../../testing/render.tsx';
import { methodAddress } from './addresses.ts';
import { decisions } from './decisions.ts';
import { entries } from './entries.ts';
import MethodPage from './method-page.tsx';
import MethodsPage from './methods-page.tsx';

const routes = [
  { path: '/methods', element: <MethodsPage /> },
  { path: '/methods/:slug', element: <MethodPage /> },
];
const at = (address: string) => renderRoutes(routes, address);
const section = (name: string) => screen.getByRole('region', { name });
const title = () => document.querySelector('h1')?.textContent;
const found = () => screen.getByRole('status').textContent;

describe('addresses', () => {
  it('lead to every method and every decision, one each', async () => {
    expect(entries.map(({ slug }) => slug).sort()).toEqual([...methodPages, ...decisions].map(({ slug }) => slug).sort());
    expect(new Set(entries.map(({ slug }) => slug)).size).toBe(entries.length);
    const router = at('/methods');
    for (const { slug, title: name, summary } of entries) {
      await act(() => router.navigate(methodAddress(slug)));
      expect(title()).toBe(name);
      expect(document.body.textContent).toContain(summary);
    }
  });

  it('say so when no method has them', () => {
    at('/methods/unheard-of');
    expect(title()).toBe('No method has this address');
    expect(screen.getByRole('link', { name: 'To the methods' }).getAttribute('href')).toBe('/methods');
  });
});

describe('the page of a method', () => {
  it('typesets the formula and says how it is used, by whom it is computed, and how near it comes', () => {
    at('/methods/welch');
    expect(document.querySelector('#formula sub')?.textContent).toBe('1');
    expect(within(section('In use')).getByText(/Needs two values in each group/)).toBeTruthy();
    expect(within(section('In use')).getByText(/Means by simple-statistics/)).toBeTruthy();
    const table = within(section('Evidence')).getByRole('table', { name: 'Compared with' });
    expect(within(table).getByRole('row', { name: /^R 4\.2\.2, t\.test 3 27 \d × 10 ?−1\d$/ })).toBeTruthy();
  });

  it('shows the digits reached on certified sets where there are any', () => {
    at('/methods/linear-regression');
    const digits = screen.getByRole('table', { name: 'Digits agreed with certified data sets' });
    expect(within(digits).getByRole('row', { name: /^Longley coefficients 1\d\.\d 11$/ })).toBeTruthy();
  });

  it('says when there is nothing to compare', () => {
    at('/methods/rounding');
    expect(within(section('Evidence')).getByText(/nothing to compare it with/)).toBeTruthy();
  });
});

describe('the pages of decisions', () => {
  it('state every open point of the standard with its choice', () => {
    at('/methods/classification');
    for (const { question, choice } of openReadings) {
      expect(screen.getByText(question)).toBeTruthy();
      expect(screen.getByText(choice)).toBeTruthy();
    }
  });

  it('print the edges of the groups', () => {
    at('/methods/groups-and-bands');
    const table = screen.getByRole('table', { name: `${levelGroups.name} (${levelGroups.id})` });
    for (const { id, label } of levelGroups.groups) expect(within(table).getByRole('row', { name: `${label} ${id}` })).toBeTruthy();
    expect(screen.getByRole('row', { name: '15–29 years y15to29' })).toBeTruthy();
  });

  it('state the rules that hide figures', () => {
    at('/methods/what-is-hidden');
    expect(within(section('Small counts')).getByText(/Counts of 1 to 10 are hidden/)).toBeTruthy();
    expect(within(section('What would give them back')).getByText(/at least 10 apart and reach 11/)).toBeTruthy();
    expect(within(section('Groups from few clinics')).getByText(/at least 3 clinics and none of them has more than 75%/)).toBeTruthy();
  });

  it('say which purpose each permission allows, as the matching decides it', () => {
    at('/methods/consent-matching');
    const table = screen.getByRole('table', { name: 'May the data be used for …' });
    const row = (purpose: string) => within(table).getByRole('row', { name: new RegExp(`^${purpose}`) }).textContent;
    expect(row(purposes.condition_research)).toBe('research on a conditionallowedallowedallowedallowednot allowed');
    expect(row(purposes.ancestry)).toContain('allowedallowednot allowednot allowedallowed');
    expect(row(purposes.not_research)).toContain('a person decides');
    expect(within(section('Terms a consent can carry')).getByText(/GA4GH Data Use Ontology/).textContent).toContain('CC BY 4.0');
  });
});

describe('the index', () => {
  it('lists every page under its question and every source of evidence', () => {
    at('/methods');
    expect(found()).toBe(`${entries.length} pages of ${entries.length}`);
    expect(within(section('Do two groups differ?')).getByRole('link', { name: 'Two groups: Welch t test' }).getAttribute('href')).toBe(
      '/methods/welch',
    );
    const table = screen.getByRole('table', { name: 'Each method beside figures from outside the registry' });
    expect(table.querySelectorAll('tbody tr')).toHaveLength(evidenceTable.length);
  });

  it('finds by words and by question, keeps both in the address, and lets go of them', async () => {
    const router = at('/methods?question=sites');
    expect(found()).toBe(`3 pages of ${entries.length}`);
    fireEvent.change(screen.getByRole('searchbox', { name: 'Search' }), { target: { value: 'funnel' } });
    await waitFor(() => expect(router.state.location.search).toBe('?question=sites&q=funnel'));
    expect(found()).toBe(`1 page of ${entries.length}`);
    expect(screen.getAllByRole('row', { name: /^Funnel plot of sites/ }).length).toBeGreaterThan(0);

    fireEvent.change(screen.getByRole('searchbox', { name: 'Search' }), { target: { value: 'unheard' } });
    await waitFor(() => expect(screen.getByText(/No page holds all of these words/)).toBeTruthy());
    fireEvent.click(screen.getByRole('button', { name: 'Show every method' }));
    await waitFor(() => expect(router.state.location.search).toBe(''));
    expect(found()).toBe(`${entries.length} pages of ${entries.length}`);
  });
});
