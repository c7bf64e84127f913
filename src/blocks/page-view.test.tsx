import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import { receiver } from '#shared/calc/harbour-receiver.fixture.ts';
import { everyKind } from './every-kind.fixture.ts';
import { createLiveStore } from './live-value/live-store.ts';
import { LiveValuesOf } from './live-value/live-values.tsx';
import { PageView } from './page-view.tsx';

afterEach(cleanup);

const context = { imageOf: (zone: readonly number[]) => `/picture?zone=${zone.join()}` };
const storeAt = (inputs: Record<string, number | string>) => {
  const quantities = receiver.map((each) => ({ ...each, id: each.symbol === 'crystal' ? 'q1' : each.symbol }));
  return createLiveStore({ manualId: 'm', quantities, inputs, onChange: () => undefined });
};
const show = (inputs: Record<string, number | string> = {}, query = '') =>
  render(
    <LiveValuesOf store={storeAt(inputs)}>
      <PageView document={everyKind} context={context} query={query} />
    </LiveValuesOf>,
  );

describe('a page that is read', () => {
  it('shows headings, steps with their markers, hazards by their word, and figures as crops of the scan', () => {
    show();
    expect(screen.getByRole('heading', { level: 2, name: 'SECTION 5.' })).toBeDefined();
    expect(screen.getByText('(1)')).toBeDefined();
    expect(screen.getByRole('note', { name: 'WARNING' }).textContent).toContain('250 volts');
    expect(screen.getByRole('img', { name: 'Injection chain' }).getAttribute('src')).toBe(
      '/picture?zone=0,200,400,300',
    );
  });

  it('shows a parts list with what its columns mean', () => {
    show();
    const table = screen.getByRole('table', { name: 'Parts list: REF. DES., DESCRIPTION' });
    expect(table.querySelector('th')?.dataset['meaning']).toBe('Reference designator');
  });

  it('ties a word to its zone of the scan', () => {
    show();
    expect(screen.getByText('SECTION').closest('[data-zone]')?.getAttribute('data-zone')).toBe('10,10,120,30');
  });

  it('marks what was searched for', () => {
    const { container } = show({}, 'plate "250 volts"');
    expect([...container.querySelectorAll('mark')].map(({ textContent }) => textContent)).toEqual([
      'plate',
      '250',
      'volts',
    ]);
  });
});

describe('a live value in a page', () => {
  it('is the printed number while the setting is home', () => {
    show();
    expect(screen.getByRole('button', { name: '16.211111 mc, Crystal' }).textContent).toBe('16.211111 mc');
  });

  it('keeps the printed number, struck, beside the new one when the channel moves it', () => {
    show({ channel: 16 });
    const value = screen.getByRole('button', { name: /16\.233333 mc, Crystal/ });
    expect(value.querySelector('s')?.textContent).toBe('16.211111 mc');
    expect(value.textContent).toContain('16.233333 mc');
  });

  it('says that it is unavailable, and why, instead of a stale number', () => {
    show({ channel: 99 });
    expect(screen.getByRole('button', { name: /unavailable, Crystal: .*Channel 99 is not in/ })).toBeDefined();
  });
});
