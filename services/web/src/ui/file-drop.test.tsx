import { fireEvent, screen } from '@testing-library/react';
import { expect, it, vi } from 'vitest';
import { renderPart } from '../testing/render.tsx';
import { FileDrop } from './file-drop.tsx';

function choose(files: readonly File[], multiple: boolean) {
  const onFiles = vi.fn((_files: readonly File[]) => undefined);
  renderPart(<FileDrop label="Session files" accept={['.csv']} multiple={multiple} onFiles={onFiles} />);
  const input = document.querySelector('input[type=file]');
  if (input === null) throw new Error('no input takes files');
  fireEvent.change(input, { target: { files } });
  return onFiles;
}

const csv = new File(['a'], 'sessions.CSV');
const picture = new File(['a'], 'scan.png');

it('takes files that end as asked, whatever their case, and names those left out', () => {
  const onFiles = choose([csv, picture], true);
  expect(onFiles).toHaveBeenCalledWith([csv]);
  expect(screen.getByRole('alert').textContent).toContain('Left out: scan.png');
});

it('takes one file where one is asked for', () => {
  const second = new File(['b'], 'more.csv');
  expect(choose([csv, second], false)).toHaveBeenCalledWith([csv]);
  expect(screen.getByRole('alert').textContent).toContain('Left out: more.csv');
});

it('calls nothing when no file fits', () => {
  expect(choose([picture], true)).not.toHaveBeenCalled();
});
