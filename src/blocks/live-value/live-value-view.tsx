import { Popover } from '#src/ui/popover.tsx';
import { inSi } from '#shared/units/in-si.ts';
import type { Zone } from '#shared/document/define-block.ts';
import { zoneKey } from '#src/blocks/look.ts';
import {
  type LiveQuantity,
  type UnitStyle,
  type ValueView,
  useLiveValue,
  useUnitStyle,
  useValueView,
} from './live-values.tsx';
import { placeValue, type PlacedValue } from './placed-value.ts';
import { ValueDetails } from './value-details.tsx';
import './live-value.css';

type Props = {
  quantityId: string;
  printed: string;
  zone: Zone | null;
  /** Reachable by Tab; in the editor the caret reaches it instead. */ isTabStop?: boolean;
};

/** A printed number that is live: pencilled over when the setting moves it, and open to questions. */
export function LiveValueView({ quantityId, printed, zone, isTabStop = true }: Props) {
  const live = useLiveValue(quantityId);
  const [view] = useValueView();
  const [units] = useUnitStyle();
  const place = zone === null ? {} : { 'data-zone': zoneKey(zone) };
  if (live === undefined)
    return (
      <span {...place} className="live">
        {printed}
      </span>
    );
  if (live === null) {
    return (
      <span
        {...place}
        className="live live-gone"
        title="This value is no longer a quantity of the manual. What was printed is shown."
      >
        {printed}
      </span>
    );
  }
  const placed = inStyle(placeValue(live.quantity, live.value, printed), units);
  const trigger = (
    <button type="button" className="live-button" tabIndex={isTabStop ? 0 : -1} aria-label={spoken(live, placed, view)}>
      <Figures placed={placed} view={view} />
    </button>
  );
  return (
    <span
      {...place}
      className="live"
      data-moved={placed.isMoved || undefined}
      data-outside={placed.isOutsideLimits || undefined}
    >
      <Popover label={`${live.quantity.label}, in full`} trigger={trigger}>
        <ValueDetails live={live} placed={placed} />
      </Popover>
    </span>
  );
}

const inStyle = (placed: PlacedValue, units: UnitStyle): PlacedValue =>
  units === 'print' ? placed : { ...placed, asSet: inSi(placed.asSet) ?? placed.asSet };

function Figures({ placed: { printed, asSet, isMoved, missing }, view }: { placed: PlacedValue; view: ValueView }) {
  if (view === 'printed') return <span className="live-number">{printed}</span>;
  if (missing !== undefined) {
    return (
      <span className="live-stack">
        <s className="live-printed">{printed}</s>
        <span className="live-missing">unavailable</span>
      </span>
    );
  }
  if (!isMoved || view === 'set') return <span className="live-number">{asSet}</span>;
  return (
    <span className="live-stack">
      <s className="live-printed">{printed}</s>
      <span className="live-number">{asSet}</span>
    </span>
  );
}

/** Begins with what can be seen, so that what is said and what is shown are one. */
function spoken(
  { quantity }: LiveQuantity,
  { printed, asSet, isMoved, missing, isOutsideLimits }: PlacedValue,
  view: ValueView,
): string {
  if (view === 'printed') return `${printed}, ${quantity.label}, as printed`;
  if (missing !== undefined) return `${printed} unavailable, ${quantity.label}: ${missing}`;
  const outside = isOutsideLimits ? ', outside its limits' : '';
  if (!isMoved) return `${asSet}, ${quantity.label}${outside}`;
  return view === 'set'
    ? `${asSet}, ${quantity.label}, printed as ${printed}${outside}`
    : `${printed} ${asSet}, ${quantity.label}: printed, then as set${outside}`;
}
