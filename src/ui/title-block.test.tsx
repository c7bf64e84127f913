import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it } from 'vitest';
import { TitleBlock } from './title-block.tsx';

afterEach(cleanup);

const cells = [
  { label: 'Document', value: 'TW 112-3', stays: true },
  { label: 'Edition', value: '1969-08' },
];

describe('a title block', () => {
  it('is the heading of the screen and names each of its cells', () => {
    render(<TitleBlock kind="Manual" title="HB-12" cells={cells} />);
    expect(screen.getByRole('heading', { level: 1, name: 'HB-12' })).toBeTruthy();
    expect(screen.getAllByRole('term').map(({ textContent }) => textContent)).toEqual(['Document', 'Edition']);
    expect(screen.getAllByRole('definition').map(({ textContent }) => textContent)).toEqual(['TW 112-3', '1969-08']);
  });

  it('unfolds and folds where the screen is narrow', async () => {
    render(<TitleBlock kind="Manual" title="HB-12" cells={cells} />);
    const fold = screen.getByRole('button', { name: 'Whole title block' });
    expect(fold.getAttribute('aria-expanded')).toBe('false');
    await userEvent.click(fold);
    expect(screen.getByRole('button', { name: 'Fold the title block' }).getAttribute('aria-expanded')).toBe('true');
  });

  it('has nothing to fold when every cell stays', () => {
    render(<TitleBlock kind="Manual" title="HB-12" cells={cells.slice(0, 1)} />);
    expect(screen.queryByRole('button')).toBeNull();
  });
});
