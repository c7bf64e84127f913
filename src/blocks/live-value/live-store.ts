import type { Quantity } from '#shared/api/quantities.ts';
import { builtInTables } from '#shared/calc/channel-plans.ts';
import type { LiveValue } from '#shared/calc/describe-value.ts';
import { type EvaluateOptions, type Evaluation, evaluate, type InputValues } from '#shared/calc/evaluate.ts';
import { createSession } from '#shared/calc/live-session.ts';
import { type Program, compile } from '#shared/calc/program.ts';
import { type Proof, proof } from '#shared/calc/proof.ts';

/** The quantities of one manual at a setting that is being changed. What is read stays the same object until it changes. */
export type LiveStore = {
  manualId: string;
  program: Program;
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
  subscribe: (listener: () => void) => () => void;
};

type Given = {
  manualId: string;
  quantities: readonly Quantity[];
  inputs: InputValues;
  onChange: (inputs: InputValues) => void;
};

export function createLiveStore({ manualId, quantities, inputs, onChange }: Given): LiveStore {
  const program = compile(quantities, builtInTables);
  const byId = new Map(quantities.map((each) => [each.id, each]));
  const inputSymbols = new Set(quantities.flatMap(({ symbol, kind }) => (kind === 'input' ? [symbol] : [])));
  const isInput = (symbol: string): boolean => inputSymbols.has(symbol);
  let setting = Object.fromEntries(Object.entries(inputs).filter(([symbol]) => isInput(symbol)));
  const session = createSession(program, setting);
  const home = evaluate(program).values;
  const listeners = new Set<() => void>();
  const held = new Map<string, LiveValue | undefined>();

  /** What changed is read anew when somebody looks; the inputs themselves always, for a refused one has a reason now. */
  const changed = (symbols: readonly string[]): void => {
    for (const symbol of symbols) held.delete(symbol);
    onChange(setting);
    listeners.forEach((listener) => listener());
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
  };
}

/** Typed at home's own value, an input is at home: nothing then counts as moved. */
const isHome = (home: LiveValue | undefined, value: number | string): boolean =>
  home?.value !== null &&
  home?.value !== undefined &&
  (value === home.value || (typeof value === 'string' && value.trim() === String(home.value)));
