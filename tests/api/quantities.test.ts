import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Caller, type TestServer, startTestServer } from '../helpers/server.ts';

let server: TestServer;
let editor: Caller;
let manualId: string;
const at = (rest: string): string => `/api/manuals/${manualId}/${rest}`;

beforeAll(async () => {
  server = await startTestServer();
  editor = await server.as('editor');
  manualId = await (await server.as('archivist')).newManual();
  // The maritime plan: ITU Radio Regulations, Appendix 18; receiver chain: crystal = (channel - first i-f) / 9.
  const quantities = [
    { symbol: 'channel', label: 'Channel', kind: 'input', unit: '', home: 12, integer: true },
    { symbol: 'firstIf', label: 'First i-f', kind: 'constant', unit: 'mc', home: 10.7, printed: { text: '10.700 mc' } },
    {
      symbol: 'carrier',
      label: 'Carrier',
      kind: 'derived',
      unit: 'mc',
      expression: 'lookup("maritime-vhf", channel, "ship")',
      printed: { text: '156.600 mc' },
    },
    {
      symbol: 'injection',
      label: 'Injection',
      kind: 'derived',
      unit: 'mc',
      expression: 'carrier - firstIf',
      printed: { text: '145.900 mc' },
    },
    {
      symbol: 'crystal',
      label: 'Crystal',
      kind: 'derived',
      unit: 'mc',
      expression: 'injection / 9',
      printed: { text: '16.211111 mc' },
    },
  ];
  for (const quantity of quantities) expect((await editor.post(at('quantities'), quantity)).status).toBe(201);
});
afterAll(() => server.stop());

describe('quantities', () => {
  it('are listed with their ids', async () => {
    const { body } = await editor.get(at('quantities'));
    expect(body.items).toHaveLength(5);
    expect(body.items[0]).toMatchObject({ id: expect.any(String), symbol: 'channel', kind: 'input', home: 12 });
  });

  it.each([
    ['a symbol that is taken', { symbol: 'crystal', label: '', kind: 'constant', unit: '', home: 1 }, 409, 'symbol'],
    [
      'a unit that is not in the table',
      { symbol: 'a1', label: '', kind: 'constant', unit: 'furlong', home: 1 },
      400,
      'unit',
    ],
    ['a derived one without an expression', { symbol: 'a1', label: '', kind: 'derived', unit: '' }, 400, 'expression'],
  ])('are refused with %s', async (_what, quantity, status, path) => {
    expect(await editor.post(at('quantities'), quantity)).toMatchObject({ status, body: { issues: [{ path }] } });
  });

  it('are changed key by key, and null takes a key away', async () => {
    const { body: made } = await editor.post(at('quantities'), {
      symbol: 'spare',
      label: 'Spare',
      kind: 'constant',
      unit: 'kc',
      home: 25,
      printed: { text: '25 kc' },
    });
    const { body } = await editor.patch(at(`quantities/${made.id}`), { home: 50, printed: null });
    expect(body).toMatchObject({ symbol: 'spare', home: 50 });
    expect(body.printed).toBeUndefined();
    expect((await editor.delete(at(`quantities/${made.id}`))).status).toBe(200);
    expect((await editor.delete(at(`quantities/${made.id}`))).status).toBe(404);
  });
});

describe('evaluating', () => {
  it('stays at home when nothing is given', async () => {
    const { body } = await editor.post(at('evaluate'), { inputs: {} });
    expect(body.values.crystal).toMatchObject({ text: '16.211111 mc', unit: 'mc', dependsOn: ['injection'] });
    expect(body.setting).toEqual({ channel: 12 });
  });

  it('moves every value that depends on the channel', async () => {
    const { body } = await (await server.as('reader')).post(at('evaluate'), { inputs: { channel: 16 } });
    expect(body.values).toMatchObject({
      carrier: { text: '156.800 mc' },
      injection: { text: '146.100 mc' },
      crystal: { text: '16.233333 mc' },
    });
    expect(body.values.crystal.value).toBeCloseTo(146.1 / 9, 12);
  });

  it('works backwards from a crystal that is to hand to the channel it serves', async () => {
    const pin = { symbol: 'crystal', value: '16.233333 mc', solveFor: 'channel' };
    const { body } = await editor.post(at('evaluate'), { inputs: {}, pin });
    expect(body.setting.channel).toBe(16);
  });

  it('says why a value cannot be had, and shows none', async () => {
    const { body } = await editor.post(at('evaluate'), { inputs: { channel: 40 } });
    expect(body.values.carrier.problem.message).toContain('40');
    expect(body.values.crystal).toMatchObject({ value: null, text: '', problem: { code: expect.any(String) } });
  });

  it('refuses a name that no quantity has', async () => {
    expect(await editor.post(at('evaluate'), { inputs: { chanel: 16 } })).toMatchObject({ status: 422 });
  });
});

describe('the proof', () => {
  it('holds while every value comes out as printed, and names the one that does not', async () => {
    expect((await editor.get(at('proof'))).body).toMatchObject({ holds: true });
    const { body: wrong } = await editor.post(at('quantities'), {
      symbol: 'image',
      label: 'Image',
      kind: 'derived',
      unit: 'mc',
      expression: 'carrier - firstIf',
      printed: { text: '135.200 mc' },
    });
    const { body } = await editor.get(at('proof'));
    expect(body.holds).toBe(false);
    expect(body.items.filter(({ agrees }: { agrees: boolean }) => !agrees)).toMatchObject([
      { symbol: 'image', printed: '135.200 mc', computed: '145.900 mc', quantityId: wrong.id },
    ]);
  });
});

describe('settings', () => {
  it('are saved by a technician and used by everybody', async () => {
    const technician = await server.as('technician');
    const made = await technician.post(at('settings'), { name: 'Unit 7, channel 16', inputs: { channel: 16 } });
    expect(made.status).toBe(201);
    const { body } = await (await server.as('reader')).get(at('settings'));
    expect(body.items).toMatchObject([
      { name: 'Unit 7, channel 16', inputs: { channel: 16 }, createdBy: 'Test technician' },
    ]);
    expect((await technician.delete(at(`settings/${made.body.id}`))).status).toBe(200);
  });
});

describe('the change sheet', () => {
  it('lists what differs between two settings, also as a file', async () => {
    const asked = { after: { channel: 16 } };
    const { status, body } = await editor.post(at('change-sheet'), asked);
    expect(status).toBe(200);
    expect(body.rows.map(({ symbol, before, after }: any) => [symbol, before, after])).toContainEqual([
      'crystal',
      '16.211111 mc',
      '16.233333 mc',
    ]);
    expect(body).toMatchObject({ leaving: 0, unavailable: 0 });
    const file = await editor.post(`${at('change-sheet')}?format=csv`, asked);
    expect(file.headers['content-type']).toContain('text/csv');
    expect(file.text).toContain('crystal,Crystal,16.211111 mc,16.211111 mc,16.233333 mc');
    expect((await editor.post(at('change-sheet'), { after: { channel: { a: 1 } } })).status).toBe(400);
  });
});

describe('the frequency plan', () => {
  const stages = [
    { id: 'y1', kind: 'crystal', name: 'Y1', from: [], frequency: 'crystal' },
    { id: 'times9', kind: 'multiplier', name: 'Triplers', from: ['y1'], factor: '9' },
  ];

  it('is kept with the manual, and its stages are values like any other', async () => {
    expect((await editor.get(at('frequency-plan'))).body).toMatchObject({ number: 0, plan: { stages: [] } });
    const saved = await editor.put(at('frequency-plan'), { baseNumber: 0, plan: { stages } });
    expect(saved).toMatchObject({ status: 200, body: { number: 1, savedBy: 'Test editor' } });
    const { body } = await editor.post(at('evaluate'), { inputs: { channel: 16 } });
    expect(body.values['plan_times9'].value).toBeCloseTo(146.1, 9);
  });

  it('is not overwritten by one that builds upon an older', async () => {
    const late = await editor.put(at('frequency-plan'), { baseNumber: 0, plan: { stages: [] } });
    expect(late).toMatchObject({ status: 409, body: { current: { number: 1 } } });
    expect((await editor.get(at('frequency-plan'))).body.plan.stages).toHaveLength(2);
  });

  it('refuses what is no plan, and readers', async () => {
    const plan = { stages: [{ id: 'a b', kind: 'siphon', name: '', from: [] }] };
    expect((await editor.put(at('frequency-plan'), { baseNumber: 1, plan })).status).toBe(400);
    const reader = await server.as('reader');
    expect((await reader.put(at('frequency-plan'), { baseNumber: 1, plan: { stages } })).status).toBe(403);
  });
});

describe('relations among the printed numbers', () => {
  it('are looked for by editors, and judged once', async () => {
    const { status, body } = await editor.post(at('relations'));
    // No page of this manual has been read, so no number is printed.
    expect({ status, body }).toEqual({ status: 200, body: { items: [], numbers: 0 } });
    const verdict = { relation: '145.9 mc = 156.6 mc - 10.7 mc', verdict: 'dismissed' };
    expect((await editor.post(at('relations/verdicts'), verdict)).status).toBe(200);
    expect((await editor.post(at('relations/verdicts'), { ...verdict, verdict: 'accepted' })).status).toBe(200);
    expect((await editor.post(at('relations/verdicts'), { relation: '', verdict: 'perhaps' })).status).toBe(400);
    expect((await (await server.as('technician')).post(at('relations'))).status).toBe(403);
  });
});
