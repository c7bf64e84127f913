/**
 * Why a quantity has no value. Shown in the place of the number; nothing stale is ever shown there.
 * `start` and `end` are columns of the expression; `cause` is the symbol where the trouble began, if elsewhere.
 */
export type CalcProblem = {
  code: CalcProblemCode;
  message: string;
  symbol: string;
  start?: number;
  end?: number;
  cause?: string;
};
export type CalcProblemCode =
  | 'bad-symbol'
  | 'duplicate-symbol'
  | 'bad-unit'
  | 'bad-expression'
  | 'unknown-symbol'
  | 'unit-mismatch'
  | 'cycle'
  | 'missing-home'
  | 'bad-table'
  | 'not-an-input'
  | 'not-a-quantity'
  | 'not-an-integer'
  | 'division-by-zero'
  | 'not-in-table'
  | 'root-of-negative'
  | 'not-finite'
  | 'depends-on-unavailable'
  | 'no-solution';
