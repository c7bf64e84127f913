import { cleanup, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { Upload } from './upload-line.ts';
import { UploadList } from './upload-list.tsx';

afterEach(cleanup);

const upload = (change: Partial<Upload>): Upload => ({
  id: 1,
  manualId: 'hb',
  fileName: 'hb-12.pdf',
  bytes: 2_000_000,
  sentBytes: 0,
  state: 'waiting',
  ...change,
});

const show = (uploads: Upload[]) => {
  const deeds = { onStop: vi.fn(), onTryAgain: vi.fn(), onPutAway: vi.fn() };
  render(<UploadList uploads={uploads} {...deeds} />);
  return deeds;
};

describe('the list of uploads', () => {
  it('says of each refused file why it was refused', () => {
    show([
      upload({ id: 1, fileName: 'notes.txt', state: 'refused', note: 'This is not a scan.' }),
      upload({ id: 2, fileName: 'empty.png', state: 'refused', note: 'This file is empty: it has no bytes at all.' }),
    ]);
    const rows = screen.getAllByRole('listitem');
    expect(within(rows[0] as HTMLElement).getByText('This is not a scan.')).toBeTruthy();
    expect(within(rows[1] as HTMLElement).getByText(/no bytes at all/)).toBeTruthy();
    expect(screen.getByRole('status').textContent).toBe('Done: 0 of 2 taken in; 2 not taken');
  });

  it('shows how far a file has come, and stops it', async () => {
    const { onStop } = show([upload({ state: 'sending', sentBytes: 500_000 })]);
    expect(screen.getByRole('progressbar', { name: 'hb-12.pdf sent' }).getAttribute('aria-valuenow')).toBe('500000');
    expect(screen.getByText(/25\s%/)).toBeTruthy();
    await userEvent.click(screen.getByRole('button', { name: 'Stop hb-12.pdf' }));
    expect(onStop).toHaveBeenCalledWith(1);
  });

  it('offers to send again what did not arrive, but not what was refused', () => {
    show([
      upload({ id: 1, state: 'failed', fileName: 'a.pdf' }),
      upload({ id: 2, state: 'refused', fileName: 'b.txt' }),
    ]);
    expect(screen.getByRole('button', { name: 'Send a.pdf again' })).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Send b.txt again' })).toBeNull();
  });
});
