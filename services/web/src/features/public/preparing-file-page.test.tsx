import { screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { fakeApi } from '../../testing/fake-api.ts';
import { renderPart } from '../../testing/render.tsx';
import PreparingFilePage from './preparing-file-page.tsx';

const note = { file: 'prepare.html', bytes: 700_967, sha256: 'c0'.repeat(32), contentSecurityPolicy: "default-src 'none'" };

describe('the page about the file', () => {
  it('says what the file hashes to, and hands it out under its name', async () => {
    fakeApi({ 'GET /prepare.json': note });
    renderPart(<PreparingFilePage />);
    expect(await screen.findByText(note.sha256)).toBeTruthy();
    expect(screen.getByText('701.0 kB')).toBeTruthy();
    const link = screen.getByRole('link', { name: 'Download the file' });
    expect(link.getAttribute('href')).toBe('/prepare.html');
    expect(link.getAttribute('download')).toBe('cairnstep-prepare.html');
    for (const program of ['certutil', 'Get-FileHash', 'shasum', 'sha256sum']) expect(screen.getByText(new RegExp(program))).toBeTruthy();
  });

  it('says so when it cannot tell the hash, and then hands out nothing', async () => {
    fakeApi({ 'GET /prepare.json': { ...note, sha256: 'unknown' } });
    renderPart(<PreparingFilePage />);
    expect((await screen.findByRole('alert')).textContent).toContain('something it does not understand');
    expect(screen.queryByRole('link', { name: 'Download the file' })).toBeNull();
  });
});
