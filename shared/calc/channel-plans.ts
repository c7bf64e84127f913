import { aeronauticalVhf, distanceX, distanceY, instrumentLanding } from './plans/aeronautical.ts';
import { fmBroadcast, television } from './plans/broadcast.ts';
import { maritimeVhf } from './plans/maritime.ts';
import {
  amateurSixtyMetres,
  citizensBand,
  familyRadio,
  generalMobileRepeaters,
  multiUse,
  weatherRadio,
} from './plans/personal-radio.ts';
import { deepSpace, turnaround } from './plans/spacecraft.ts';
import { standardIfs, timeStations } from './plans/standards.ts';
import type { LookupTable } from './tables.ts';

/** The tables that every manual may look into without bringing them. Rows are made when first looked at. */
export const builtInTables: readonly LookupTable[] = [
  maritimeVhf,
  citizensBand,
  familyRadio,
  generalMobileRepeaters,
  multiUse,
  weatherRadio,
  amateurSixtyMetres,
  fmBroadcast,
  television,
  aeronauticalVhf,
  instrumentLanding,
  distanceX,
  distanceY,
  deepSpace,
  turnaround,
  timeStations,
  standardIfs,
];
