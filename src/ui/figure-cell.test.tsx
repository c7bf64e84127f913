import { cleanup, render } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import { FigureCell, roomFor } from './figure-cell.tsx';

afterEach(cleanup);

describe('a column of numbers', () => {
  it('makes room for the longest on each side of the point', () => {
    expect(roomFor(['156.600 mc', '9', '.01 mfd', '16.2111', 'none'])).toEqual({ left: 3, right: 5 });
  });

  it('keeps a text that is no number as it is', () => {
    expect(render(<FigureCell text="see note" unit="mc" />).container.textContent).toBe('see note');
  });

  it('sets the unit after a thin space', () => {
    expect(render(<FigureCell text="16.2111 mc" />).container.textContent).toBe('16.2111\u2009mc');
  });

  it('reads a number that begins with its point', () => {
    expect(render(<FigureCell text=".01" unit="µF" />).container.textContent).toBe('.01\u2009µF');
  });
});
