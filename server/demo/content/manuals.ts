import { hb12 } from './hb-12.ts';
import { sg4 } from './sg-4.ts';
import type { DemoManual } from './types.ts';

export const demoManuals: readonly DemoManual[] = [hb12, sg4];
