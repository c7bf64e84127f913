import { cleanup, render } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import { MarkedText, stretches } from './marked-text.tsx';

afterEach(cleanup);

describe('a snippet with marks', () => {
  it('marks just what was hit, and loses no letter', () => {
    const { container } = render(<MarkedText text="the difference of 455 kc passes" marks={[[18, 24]]} />);
    expect([...container.querySelectorAll('mark')].map(({ textContent }) => textContent)).toEqual(['455 kc']);
    expect(container.textContent).toBe('the difference of 455 kc passes');
  });

  it('shows text as text, whatever it looks like', () => {
    const { container } = render(<MarkedText text="<b>V7</b>" marks={[[3, 5]]} />);
    expect(container.querySelector('b')).toBeNull();
    expect(container.querySelector('mark')?.textContent).toBe('V7');
  });

  it.each([
    [
      'overlap',
      [
        [0, 4],
        [2, 6],
      ],
    ],
    [
      'stand in the wrong order',
      [
        [4, 6],
        [0, 2],
      ],
    ],
    ['reach past the end', [[4, 99]]],
    ['are empty', [[2, 2]]],
  ] as [string, [number, number][]][])('loses no letter when marks %s', (_how, marks) => {
    expect(
      stretches('abcdefgh', marks)
        .map(({ text }) => text)
        .join(''),
    ).toBe('abcdefgh');
  });
});
