import { benchReading } from './reading.ts';
import { benchRecompute } from './recompute.ts';
import { benchSearch } from './search.ts';
import { benchSizes } from './sizes.ts';

/** Figures of speed and size, each beside a named reference measured in the same run: `npm run bench [-- name ...]`. */
const benches: Record<string, () => Promise<string[]> | string[]> = {
  sizes: benchSizes,
  reading: benchReading,
  recompute: benchRecompute,
  search: benchSearch,
};

const wanted = process.argv.slice(2).filter((name) => name in benches);
for (const [name, bench] of Object.entries(benches)) {
  if (wanted.length > 0 && !wanted.includes(name)) continue;
  console.log(`\n${name}`);
  for (const line of await bench()) console.log(`  ${line}`);
}
process.exit(0);
