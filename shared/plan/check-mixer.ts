import { finding, type Finding } from './finding.ts';
import { mixerProducts, nameProduct, type MixerProduct } from './mixer-products.ts';
import type { Stage, StageOf } from './plan.ts';
import {
  bandOf,
  commonBand,
  filtersAfter,
  filtersBefore,
  frequencyOf,
  isInside,
  partOf,
  showBand,
  showHz,
  type Band,
  type ValuedPlan,
} from './signal-path.ts';
import { nameStage } from './stage-words.ts';

/** Products beyond this are weak in any usual mixer; common practice, no source. */
const highestOrder = 7;

/** The side of the injection, what else the mixer hears, and which of its products fall into the IF that follows. */
export function checkMixer(valued: ValuedPlan, stage: StageOf<'mixer'>): Finding[] {
  const [signal, injection] = stage.from.map((id) => frequencyOf(valued, id));
  const wanted = frequencyOf(valued, stage.id);
  if (signal === undefined || injection === undefined || !Number.isFinite(wanted)) return [];
  if (wanted < 0) return [wrongInjection(stage, { signal, injection })];
  return [
    ...checkResponse(valued, stage, 'image'),
    ...(stage.product === 'difference' ? checkResponse(valued, stage, 'half_if') : []),
    ...checkProducts(valued, stage, { signal, injection }),
  ];
}

type Pair = { signal: number; injection: number };

const wrongInjection = (stage: StageOf<'mixer'>, { signal, injection }: Pair): Finding =>
  finding(stage, ['wrong-injection', 'alarm'], {
    says:
      `the injection is set to ${stage.injection}, but at ${showHz(injection)} it lies ` +
      `${injection < signal ? 'below' : 'above'} the signal at ${showHz(signal)}. ` +
      `Set it to ${stage.injection === 'low' ? 'high' : 'low'}, or change one of the two frequencies.`,
  });

const responseWords = {
  image: { code: 'image', name: 'the image' },
  half_if: { code: 'half-if', name: 'the half-IF response' },
} as const;

function checkResponse(valued: ValuedPlan, stage: Stage, part: 'image' | 'half_if'): Finding[] {
  const hz = Math.abs(partOf(valued, stage.id, part));
  if (Number.isNaN(hz)) return [];
  const { code, name } = responseWords[part];
  const bands = filtersBefore(valued, stage.from[0]).flatMap((filter) => {
    const band = bandOf(valued, filter.id);
    return band === undefined ? [] : [{ filter, band }];
  });
  const says = (rest: string): { says: string; hz: number } => ({ says: `${name} is at ${showHz(hz)}${rest}`, hz });
  const rejects = bands.find(({ band }) => !isInside(hz, band));
  if (rejects !== undefined)
    return [
      finding(stage, [code, 'good'], says(`; ${nameStage(rejects.filter)} keeps it out (${showBand(rejects.band)}).`)),
    ];
  const admits = bands[0];
  if (admits !== undefined)
    return [
      finding(
        stage,
        [code, code === 'image' ? 'alarm' : 'doubt'],
        says(
          `, and ${nameStage(admits.filter)} lets it in (${showBand(admits.band)}). Narrow it, or move the injection.`,
        ),
      ),
    ];
  return [
    finding(
      stage,
      [code, code === 'image' ? 'doubt' : 'note'],
      says('; no filter with a pass band stands before the mixer. Add one, or enter its pass band.'),
    ),
  ];
}

function checkProducts(valued: ValuedPlan, stage: StageOf<'mixer'>, { signal, injection }: Pair): Finding[] {
  const filters = filtersAfter(valued, stage.id);
  const band = commonBand(valued, filters);
  if (band === undefined)
    return [
      finding(stage, ['no-if-filter', 'note'], {
        says: 'no filter with a pass band follows, so its unwanted products cannot be checked. Add one, or enter its pass band.',
      }),
    ];
  return productsIn(band, { signal, injection }, stage.product).map((product) =>
    finding(stage, ['product-in-if', product.order <= 3 ? 'alarm' : 'doubt'], {
      says:
        `${nameProduct(product)} (order ${product.order}) falls at ${showHz(product.hz)}, ` +
        `inside the pass band that follows (${showBand(band)}).`,
      hz: product.hz,
    }),
  );
}

/** Lowest order first; the wanted product is no spurious one. */
function productsIn(band: Band, { signal, injection }: Pair, product: 'sum' | 'difference'): MixerProduct[] {
  const wantedSign = product === 'sum' ? 1 : -1;
  return mixerProducts(injection, signal, highestOrder)
    .filter(({ m, n, hz }) => !(m === 1 && n === wantedSign) && isInside(hz, band))
    .sort((a, b) => a.order - b.order);
}
