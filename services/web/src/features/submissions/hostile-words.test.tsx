/** What a file called its columns is shown as it stands, however it is written. */
import { screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { fakeApi } from '../../testing/fake-api.ts';
import { renderRoutes } from '../../testing/render.tsx';
import { checked, coordinator, error, submissionId } from './sample-submission.ts';
import SubmitPage from './submit-page.tsx';

const path = `/api/submissions/${submissionId}`;
const hostile = [
  '<img src=x onerror="globalThis.ran=1">',
  '<script>globalThis.ran=1</script>',
  '"><svg onload=globalThis.ran=1>',
  '\u202Egpj.exe',
  'x'.repeat(500),
];

describe('findings about columns with hostile names', () => {
  it.each(hostile)('show the name as text: %s', async (column) => {
    const finding = { id: 1, rule: 'F06', severity: 'error', table: 'sessions', line: 1, column, found: column, mend: error.mend };
    fakeApi({
      'GET /api/account': coordinator,
      [`GET ${path}`]: checked({ findings: [{ ...error, rule: 'F06' }], preview: null }),
      [`GET ${path}/findings`]: { items: [finding], page: 1, pageSize: 50, total: 1 },
    });
    renderRoutes([{ path: '/submit/:submissionId', element: <SubmitPage /> }], `/submit/${submissionId}?rule=F06`);
    const shown = await screen.findAllByText((_, element) => element?.childElementCount === 0 && element.textContent === column);
    expect(shown.length).toBeGreaterThan(0);
    expect(document.querySelector('img, script, svg[onload]')).toBeNull();
    expect('ran' in globalThis).toBe(false);
  });
});
