/** A relation as a sum of terms that is zero: coefficient by key. */
export type LinearForm = ReadonlyMap<string, number>;
export type LinearBasis = {
  /** False where the form follows from those added before. */
  add: (form: LinearForm) => boolean;
  implies: (form: LinearForm) => boolean;
  /** The same text for forms that say the same once the basis holds; '' for one that follows from it. */
  residue: (form: LinearForm) => string;
};

/** Coefficients are small whole numbers, and elimination leaves fractions of them: anything below this is zero. */
const grain = 1e-9;

/** Gauss's elimination over sparse rows, each kept with its leading key. */
export function createBasis(): LinearBasis {
  const rows = new Map<string, Map<string, number>>();
  const reduce = (form: LinearForm): Map<string, number> => {
    const left = new Map(form);
    // A row may bring in keys that lead rows of their own: go on until no leading key is left.
    for (;;) {
      const key = [...left.keys()].find((each) => rows.has(each));
      const row = key === undefined ? undefined : rows.get(key);
      if (key === undefined || row === undefined) return left;
      const times = left.get(key) ?? 0;
      for (const [each, coefficient] of row) {
        const sum = (left.get(each) ?? 0) - times * coefficient;
        if (Math.abs(sum) < grain) left.delete(each);
        else left.set(each, sum);
      }
      left.delete(key);
    }
  };
  /** Rows are kept free of each other's leading keys, so that reducing ends. */
  const insert = (left: Map<string, number>): void => {
    const [lead] = [...left].reduce((best, each) => (Math.abs(each[1]) > Math.abs(best[1]) ? each : best));
    const size = left.get(lead) ?? 1;
    const row = new Map([...left].map(([key, each]) => [key, each / size]));
    for (const other of rows.values()) {
      const times = other.get(lead);
      if (times === undefined) continue;
      for (const [key, each] of row) {
        const sum = (other.get(key) ?? 0) - times * each;
        if (Math.abs(sum) < grain) other.delete(key);
        else other.set(key, sum);
      }
    }
    rows.set(lead, row);
  };
  return {
    implies: (form) => reduce(form).size === 0,
    residue: (form) => {
      const left = [...reduce(form)].sort(([a], [b]) => (a < b ? -1 : 1));
      const first = left[0]?.[1] ?? 1;
      return left.map(([key, each]) => `${key} ${(each / first).toPrecision(9)}`).join(' ');
    },
    add: (form) => {
      const left = reduce(form);
      if (left.size === 0) return false;
      insert(left);
      return true;
    },
  };
}
