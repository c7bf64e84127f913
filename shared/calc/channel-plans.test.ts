import { describe, expect, it } from 'vitest';
import { fromBase, toBase } from '#shared/units/convert.ts';
import { findUnit } from '#shared/units/definitions.ts';
import { channelCases, channelSources } from './channel-plans.cases.ts';
import { builtInTables } from './channel-plans.ts';
import { maritimeVhf } from './plans/maritime.ts';
import { describeKeys, lazyTable, viewTable } from './tables.ts';

describe('the maritime plan', () => {
  const view = viewTable(maritimeVhf);
  // ITU Radio Regulations, Appendix 18 (from memory; agreeing with 47 CFR 80.373(f), 2015, and two published lists).
  it.each([
    [1, 156.05, 160.65],
    [7, 156.35, 160.95],
    [12, 156.6, 156.6],
    [16, 156.8, 156.8],
    [20, 157, 161.6],
    [28, 157.4, 162],
    [60, 156.025, 160.625],
    [70, 156.525, 156.525],
    [77, 156.875, 156.875],
    [87, 157.375, 157.375],
    [88, 157.425, 157.425],
  ])('channel %d is %d / %d MHz', (channel, ship, coast) => {
    expect(maritimeVhf.rows.find(([key]) => key === channel)).toEqual([channel, ship, coast]);
    expect(view?.columns.get('coast')?.read(channel)).toBe(Math.round(coast * 1e6));
  });

  it('has 57 channels and says which', () => {
    expect(maritimeVhf.rows).toHaveLength(57);
    expect(describeKeys(maritimeVhf)).toBe('1 to 28 and 60 to 88');
    expect(view?.explainMiss(59)).toContain('Channel 59');
  });
});

const views = new Map(builtInTables.map((table) => [table.id, { table, view: viewTable(table) }]));
const read = (id: string, column: string, key: number, unit: string): number => {
  const { table, view } = views.get(id) ?? {};
  const [keyUnit, to] = [findUnit(table?.key.unit ?? ''), findUnit(unit)];
  if (!keyUnit.ok || !to.ok) return NaN;
  return fromBase(view?.columns.get(column)?.read(toBase(key, keyUnit.value)) ?? NaN, to.value);
};

describe('published channels', () => {
  it.each(channelCases)('$table $key: $column is $expected $unit', (each) => {
    expect(channelSources[each.source]).not.toBe('');
    const value = read(each.table, each.column, each.key, each.unit);
    expect(Math.abs(value - each.expected)).toBeLessThanOrEqual(each.tolerance);
  });

  it('all have a source, heads with known units, and a key only once', () => {
    expect(new Set(builtInTables.map(({ id }) => id)).size).toBe(builtInTables.length);
    for (const { table, view } of views.values()) {
      expect(view).not.toBeNull();
      expect(table.source).not.toBe('');
      expect(new Set(table.rows.map(([key]) => key)).size).toBe(table.rows.length);
      expect(table.rows.every((row) => row.length === table.columns.length + 1)).toBe(true);
      if (table.rowNames !== undefined) expect(table.rowNames).toHaveLength(table.rows.length);
    }
  });
});

describe('traps of the plans', () => {
  const rowsOf = (id: string) => views.get(id)?.table.rows ?? [];

  // 47 CFR 95.407(a): the raster without five places; 23 lies above 24 and 25. A public table prints channel 32 as channel 22.
  it('Citizens Band: 40 different channels, three out of order, five gaps', () => {
    const mhz = rowsOf('us-cb').map(([, each = NaN]) => each);
    expect(new Set(mhz).size).toBe(40);
    expect(mhz.slice(22, 25)).toEqual([27.255, 27.235, 27.245]);
    for (const gap of [26.995, 27.045, 27.095, 27.145, 27.195]) expect(mhz).not.toContain(gap);
    expect(mhz[31]).not.toBe(mhz[21]);
  });

  // ICAO Annex 10 Volume V, table 4-1 (bis), from memory; two open programs.
  it('aeronautical names are no frequencies', () => {
    expect(rowsOf('aeronautical-vhf')).toHaveLength(760 + 2280);
    for (const name of [118.02, 118.045, 118.07, 118.095, 121.52])
      expect(read('aeronautical-vhf', 'carrier', name, 'MHz')).toBeNaN();
    expect(read('aeronautical-vhf', 'carrier', 118.005, 'MHz')).toBe(118);
    expect(read('aeronautical-vhf', 'spacing', 118, 'kHz')).toBe(25);
    expect(read('aeronautical-vhf', 'spacing', 118.005, 'kHz')).toBeCloseTo(25 / 3, 12);
    expect(read('aeronautical-vhf', 'carrier', 118.03, 'MHz')).toBe(118.025);
    expect(read('aeronautical-vhf', 'carrier', 118.015, 'Hz') - 118e6).toBeCloseTo(50_000 / 3, 6);
  });

  // FAA AIM table 1-1-4: the glide paths fill the raster 329.15 + 0.15 k, k = 0 to 39, each once.
  it('glide paths are the forty of their raster', () => {
    const paths = rowsOf('ils').map(([, path = NaN]) => Math.round(path * 100));
    expect(paths.toSorted((a, b) => a - b)).toEqual(Array.from({ length: 40 }, (_, at) => 32_915 + 15 * at));
    expect(read('ils', 'glide path', 108.2, 'MHz')).toBeNaN();
  });

  // A frequency of a pair must be that of the DME channel beside it.
  it('a localizer and its DME channel name each other', () => {
    for (const [localizer = NaN, , channel = NaN] of rowsOf('ils')) {
      const table = Math.round(localizer * 100) % 10 === 5 ? 'dme-y' : 'dme-x';
      expect(read(table, 'VHF', channel, 'MHz')).toBe(localizer);
    }
  });

  // 47 CFR 73.603(a).
  it('television leaves 72 to 76 MHz free, and FM is a raster', () => {
    expect(read('us-tv', 'upper', 4, 'MHz')).toBe(72);
    expect(read('us-tv', 'lower', 5, 'MHz')).toBe(76);
    expect(read('us-tv', 'oscillator', 2, 'MHz')).toBe(101);
    expect(rowsOf('us-fm')).toHaveLength(101);
    expect(read('us-tv', 'lower', 1, 'MHz')).toBeNaN();
  });

  // 47 CFR 95.29 (2015): a repeater input lies 5 MHz above, on 15 to 22 only.
  it('only eight channels of GMRS have a repeater, and there is no eighth weather channel', () => {
    expect(read('us-gmrs-repeaters', 'input', 14, 'MHz')).toBeNaN();
    expect(read('us-gmrs-repeaters', 'input', 22, 'MHz')).toBe(467.725);
    expect(read('us-weather', 'frequency', 8, 'MHz')).toBeNaN();
  });

  // Anderson et al. 2001; CCSDS 411.0-G-3; published S-band pairs. Within a channel the ratios are exact.
  it('turnaround ratios join the links of a channel, and 880/241 is none of them', () => {
    const [ss = NaN, sx = NaN, xx = NaN] = rowsOf('turnaround').map(([, over = NaN, under = NaN]) => over / under);
    for (const [, sUp = NaN, sDown = NaN, xUp = NaN, xDown = NaN] of rowsOf('deep-space')) {
      expect(sUp * ss).toBeCloseTo(sDown, 6);
      expect(sUp * sx).toBeCloseTo(xDown, 6);
      expect(xUp * xx).toBeCloseTo(xDown, 6);
    }
    expect(rowsOf('turnaround').some(([, over, under]) => over === 880 && under === 241)).toBe(false);
    expect(2106.40625 * ss).toBeCloseTo(2287.5, 9);
    expect(Math.abs(2101.802 * ss - 2282.5)).toBeLessThan(0.0005);
    expect(Math.abs(2111.607 * ss - 2293.148)).toBeLessThan(0.001);
  });

  it('the stations are 33 carriers, and RBU stands on 66 2/3 kHz', () => {
    expect(rowsOf('time-stations')).toHaveLength(33);
    expect(read('time-stations', 'carrier', 33, 'kHz')).toBe(200 / 3);
    // 47 CFR 73.682(a): picture less sound IF is the intercarrier sound, in both generations of sets.
    const ifs = rowsOf('standard-ifs').map(([, khz = NaN]) => khz);
    expect([ifs[9], ifs[12]].map((picture = NaN, at) => picture - (ifs[at === 0 ? 10 : 13] ?? NaN))).toEqual([
      4500, 4500,
    ]);
  });

  it('cost nothing until they are looked into', () => {
    let made = 0;
    const table = lazyTable(
      {
        id: 'plan',
        title: 'Plan',
        source: 'invented',
        key: { name: 'channel', unit: '' },
        columns: [{ name: 'f', unit: 'MHz' }],
      },
      () => [[(made += 1), 156.6]],
    );
    const view = viewTable(table);
    expect(made).toBe(0);
    expect(view?.columns.get('f')?.read(1)).toBe(156.6e6);
    expect(made).toBe(1);
  });
});
