import type { Quantity } from '#shared/api/quantities.ts';
import { builtInTables } from '#shared/calc/channel-plans.ts';
import type { LiveValue } from '#shared/calc/describe-value.ts';
import { type EvaluateOptions, type Evaluation, evaluate, type InputValues } from '#shared/calc/evaluate.ts';
import { createSession } from '#shared/calc/live-session.ts';
import { type Program, compile } from '#shared/calc/program.ts';
import { type Proof, proof } from '#shared/calc/proof.ts';
import type { LookupTable } from '#shared/calc/tables.ts';
import { type PlanProblem, compilePlan } from '#shared/plan/compile-plan.ts';
import type { FrequencyPlan } from '#shared/plan/plan.ts';
import type { Redraws } from './redraws.ts';

/** The quantities of one manual at a setting that is being changed. What is read stays the same object until it changes. */
export type LiveStore = {
  manualId: string;
  program: Program;
  plan: FrequencyPlan;
  /** What is wrong with the plan whatever the setting. */
  planProblems: readonly PlanProblem[];
  quantities: readonly Quantity[];
  quantity: (id: string) => Quantity | undefined;
  proof: Proof;
  /** Every value at home, where the manual was printed. */
  home: Readonly<Record<string, LiveValue>>;
  read: (symbol: string) => LiveValue | undefined;
  /** The inputs that stand away from home, and what they were set to. */
  setting: () => InputValues;
  set: (symbol: string, value: number | string) => void;
  backToHome: (symbol?: string) => void;
  takeSetting: (inputs: InputValues) => void;
  /** The whole manual anew at the present setting, with what is only worked out when asked for. */
  evaluate: (options: EvaluateOptions) => Evaluation;
  /** Told of every change at once: for the setting itself and what sums it up. */
  subscribe: (listener: () => void) => () => void;
  /** Told when one value has changed, in turn with the others: for the many values of a page. */
  follow: (symbol: string, listener: () => void) => () => void;
};

type Given = {
  manualId: string;
  quantities: readonly Quantity[];
  /** The manual's own channel tables, besides the published ones. */
  tables?: readonly LookupTable[];
  /** The signal chain, whose stages are quantities too. */
  plan?: FrequencyPlan;
  inputs: InputValues;
  onChange: (inputs: InputValues) => void;
  /** Tells those who follow values; without it, at once. */
  redraws?: Redraws;
};

const atOnce: Redraws = {
  ask: (redraws) => {
    for (const redraw of redraws) redraw();
  },
};

const noPlan: FrequencyPlan = { stages: [] };

export function createLiveStore(given: Given): LiveStore {
  const { manualId, quantities, tables = [], plan = noPlan, onChange, redraws = atOnce } = given;
  const { program, planProblems } = compiled(quantities, tables, plan);
  const byId = new Map(quantities.map((each) => [each.id, each]));
  const inputs = new Set(quantities.flatMap(({ kind, symbol }) => (kind === 'input' ? [symbol] : [])));
  const isInput = (symbol: string): boolean => inputs.has(symbol);
  let setting = Object.fromEntries(Object.entries(given.inputs).filter(([symbol]) => isInput(symbol)));
  const session = createSession(program, setting);
  const home = evaluate(program).values;
  const listeners = new Set<() => void>();
  const followers = createFollowers(redraws);
  const held = new Map<string, LiveValue | undefined>();

  /** What changed is read anew when somebody looks; the inputs themselves always, for a refused one has a reason now. */
  const changed = (symbols: readonly string[]): void => {
    for (const symbol of symbols) held.delete(symbol);
    onChange(setting);
    listeners.forEach((listener) => listener());
    followers.tell(symbols);
  };
  const set = (symbol: string, value: number | string): string[] => {
    if (!isInput(symbol)) return [];
    const { changed: symbols } = isHome(home[symbol], value) ? session.reset(symbol) : session.set(symbol, value);
    const { [symbol]: _old, ...others } = setting;
    setting = isHome(home[symbol], value) ? others : { ...others, [symbol]: value };
    return [...symbols, symbol];
  };
  return {
    manualId,
    program,
    plan,
    planProblems,
    quantities,
    quantity: (id) => byId.get(id),
    proof: proof(program),
    home,
    read: (symbol) => {
      if (!held.has(symbol)) held.set(symbol, session.read(symbol));
      return held.get(symbol);
    },
    setting: () => setting,
    set: (symbol, value) => changed(set(symbol, value)),
    backToHome: (symbol) => {
      const left = symbol === undefined ? Object.keys(setting) : [symbol];
      setting = Object.fromEntries(Object.entries(setting).filter(([each]) => !left.includes(each)));
      // Only what differs is drawn again: on a page of a thousand values most stand still.
      changed([...session.reset(symbol).changed, ...left]);
    },
    takeSetting: (next) => {
      const left = Object.keys(setting);
      setting = {};
      const symbols = [...left, ...session.reset().changed];
      for (const [symbol, value] of Object.entries(next)) symbols.push(...set(symbol, value));
      changed(symbols);
    },
    evaluate: (options) => evaluate(program, setting, options),
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    follow: followers.follow,
  };
}

/** Who wants to know of which value. */
function createFollowers(redraws: Redraws): Pick<LiveStore, 'follow'> & { tell: (symbols: readonly string[]) => void } {
  const bySymbol = new Map<string, Set<() => void>>();
  return {
    tell: (symbols) => redraws.ask(symbols.flatMap((symbol) => [...(bySymbol.get(symbol) ?? [])])),
    follow: (symbol, listener) => {
      const own = bySymbol.get(symbol) ?? new Set();
      bySymbol.set(symbol, own.add(listener));
      return () => own.delete(listener);
    },
  };
}

function compiled(quantities: readonly Quantity[], tables: readonly LookupTable[], plan: FrequencyPlan) {
  const lookedInto = [...builtInTables, ...tables];
  const { definitions, problems } = compilePlan(plan, quantities, lookedInto);
  return { program: compile([...quantities, ...definitions], lookedInto), planProblems: problems };
}

/** Typed at home's own value, an input is at home: nothing then counts as moved. */
const isHome = (home: LiveValue | undefined, value: number | string): boolean =>
  home?.value !== null &&
  home?.value !== undefined &&
  (value === home.value || (typeof value === 'string' && value.trim() === String(home.value)));
