import { foot, head, heading, note, paragraph, table } from './blocks.ts';
import { shipFrequencyKc } from './maritime-channels.ts';
import type { ManualPage } from './types.ts';

const firstIfKc = 10_700;
const multiplier = 9;

/** The channels a harbour uses: port operations and ship movement, and the calling channel 16. */
const listedChannels = [5, 6, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 18, 20, 22, 67, 68, 69, 71, 72, 73, 74, 77, 80];

const inMc = (kc: number, digits: number): string => (kc / 1000).toFixed(digits);

function channelRow(channel: number): string[] {
  const shipKc = shipFrequencyKc(channel);
  const injectionKc = shipKc - firstIfKc;
  return [String(channel), inMc(shipKc, 3), inMc(injectionKc, 3), inMc(injectionKc / multiplier, 6)];
}

const channels: ManualPage = {
  label: '5-3',
  blocks: [
    head('HB-12 HARBOUR RECEIVER'),
    heading(2, '5.8 TABLE OF CHANNELS'),
    paragraph(
      'The ship frequency is that on which the receiver listens. Channels 60 to 88 lie half way between the older ones and come into use by international agreement in 1972. The crystals are listed to the nearest cycle.',
    ),
    table(
      { caption: 'Table 5-1. Channels and crystals', ruled: true },
      ['CHANNEL', 'SHIP MC', 'INJECTION MC', 'CRYSTAL MC'],
      listedChannels.map(channelRow),
    ),
    note(
      'Channel 16 is the calling and distress channel. A set crystalled for it is subject to the rules for watch receivers.',
    ),
    foot('5-3'),
  ],
};

export const hb12Channels = [channels];
