import { benchCoediting } from './coediting.ts';
import { benchDoubts } from './doubts.ts';
import { benchFrames } from './frames.ts';
import { benchReading } from './reading.ts';
import { benchRecognition } from './recognition.ts';
import { benchRecompute } from './recompute.ts';
import { benchSearch } from './search.ts';
import { benchSizes } from './sizes.ts';
import { benchWorkers } from './workers.ts';

/** Figures of speed and size, each beside a named reference measured in the same run: `npm run bench [-- name ... option=value ...]`. */
const benches: Record<string, (args: readonly string[]) => Promise<string[]> | string[]> = {
  sizes: benchSizes,
  reading: benchReading,
  recognition: benchRecognition,
  workers: benchWorkers,
  recompute: benchRecompute,
  search: benchSearch,
  frames: benchFrames,
  doubts: benchDoubts,
  coediting: benchCoediting,
};

const args = process.argv.slice(2);
const wanted = args.filter((name) => name in benches);
for (const [name, bench] of Object.entries(benches)) {
  if (wanted.length > 0 && !wanted.includes(name)) continue;
  console.log(`\n${name}`);
  for (const line of await bench(args)) console.log(`  ${line}`);
}
process.exit(0);
