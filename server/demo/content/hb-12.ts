import { hb12Alignment } from './hb-12-alignment.ts';
import { hb12Channels } from './hb-12-channels.ts';
import { hb12Front } from './hb-12-front.ts';
import { hb12Parts } from './hb-12-parts.ts';
import { hb12Plan } from './hb-12-plan.ts';
import { hb12LivePlaces, hb12Quantities } from './hb-12-quantities.ts';
import { hb12Diagrams, hb12Theory } from './hb-12-theory.ts';
import type { DemoManual } from './types.ts';

export const hb12: DemoManual = {
  slug: 'hb-12',
  title: 'HB-12 Harbour Receiver: Service Manual',
  equipment: 'HB-12 harbour receiver',
  maker: 'Tarnholt Works',
  documentNumber: 'TW 112-3',
  editionDate: '1969-08',
  pages: [...hb12Front, ...hb12Theory, ...hb12Alignment, ...hb12Channels, ...hb12Parts, ...hb12Diagrams],
  quantities: hb12Quantities,
  livePlaces: hb12LivePlaces,
  plan: hb12Plan,
};
