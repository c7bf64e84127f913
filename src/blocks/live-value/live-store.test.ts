import { describe, expect, it, vi } from 'vitest';
import { receiver } from '#shared/calc/harbour-receiver.fixture.ts';
import { createLiveStore } from './live-store.ts';
import { settingFromAddress, settingInAddress } from './setting-storage.ts';

const quantities = receiver.map((each) => ({ ...each, id: `id-${each.symbol}` }));
const storeAt = (inputs: Record<string, number | string> = {}, onChange = vi.fn()) =>
  createLiveStore({ manualId: 'm', quantities, inputs, onChange });

describe('the values of a manual at a setting', () => {
  it('move with the channel, and come home again', () => {
    const store = storeAt();
    expect(store.read('crystal')?.text).toBe('16.211111 mc');
    store.set('channel', 16);
    expect(store.read('crystal')?.text).toBe('16.233333 mc');
    store.backToHome();
    expect(store.read('crystal')?.text).toBe('16.211111 mc');
    expect(store.setting()).toEqual({});
  });

  it('stay the same object while nothing moves them, so that what shows them is not drawn again', () => {
    const store = storeAt();
    const [crystal, second] = [store.read('crystal'), store.read('second_if')];
    store.set('channel', 16);
    expect(store.read('second_if')).toBe(second);
    expect(store.read('crystal')).not.toBe(crystal);
  });

  it('are only made anew where going home, or taking a setting, changes them', () => {
    const store = storeAt({ channel: 16 });
    const [crystal, second] = [store.read('crystal'), store.read('second_if')];
    store.backToHome();
    expect(store.read('second_if')).toBe(second);
    expect(store.read('crystal')).not.toBe(crystal);
    store.takeSetting({ channel: 12 });
    const home = store.read('crystal');
    store.takeSetting({ channel: 16 });
    expect(store.read('second_if')).toBe(second);
    expect(store.read('crystal')).toEqual(crystal);
    store.takeSetting({});
    expect(store.read('crystal')).toEqual(home);
  });

  it('never show a stale number behind a refused input', () => {
    const store = storeAt();
    store.set('channel', 99);
    expect(store.read('crystal')).toMatchObject({ value: null, text: '' });
    store.set('channel', 'twelve');
    expect(store.read('channel')?.problem?.message).toContain('does not begin with a number');
  });

  it('tell whoever listens, and say what is away from home', () => {
    const onChange = vi.fn();
    const store = storeAt({}, onChange);
    const listener = vi.fn();
    store.subscribe(listener);
    store.set('channel', 16);
    expect(listener).toHaveBeenCalledOnce();
    expect(onChange).toHaveBeenLastCalledWith({ channel: 16 });
    store.set('channel', 12);
    expect(onChange).toHaveBeenLastCalledWith({});
  });

  it('begin at the setting that was kept, without inputs the manual no longer has', () => {
    const store = storeAt({ channel: 16, gone: 3 });
    expect(store.setting()).toEqual({ channel: 16 });
    expect(store.read('carrier')?.value).toBe(156.8);
  });
});

describe('a setting in an address', () => {
  it('is read as it was written', () => {
    const inputs = { channel: 16, first_if: '10.7 mc' };
    expect(settingFromAddress(settingInAddress(inputs))).toEqual(inputs);
    expect(settingFromAddress('')).toEqual({});
  });
});
