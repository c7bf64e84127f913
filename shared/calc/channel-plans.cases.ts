/** Published channels to hold the built-in tables against; `tolerance` in the column's unit. Each names its source and how well that is known. */
export const channelSources = {
  cfr95_407: '47 CFR 95.407(a) (CB Rule 7), editions of 1997, 2014 and 2016; the same table is now 47 CFR 95.963',
  cfr73_501: '47 CFR 73.501, channel 200 = 87.9 MHz',
  cfr73_201: '47 CFR 73.201, Numerical designation of FM broadcast channels (2006, 2017 texts)',
  cfr73_603: '47 CFR 73.603(a), Numerical designation of television channels (2015 and 2021 texts)',
  cfr73_682:
    '47 CFR 73.682(a), analogue TV transmission standards: visual carrier 1.25 MHz above lower edge, aural 4.5 MHz above visual, chrominance subcarrier 63/88 x 5 MHz, line 2/455 of it (15,734.264 Hz), field 59.94 Hz; 2015 annual edition',
  code833:
    'Two independent open-source programs whose documentation/tests state 118.005->118.0000, 118.010->118.0083, 118.015->118.0167, 118.030->118.0250',
  frs_lists: 'Four independent open-source channel lists (FRS/GMRS 1-22)',
  cfr95_29: '47 CFR 95.29 (GMRS channels available), 2015 annual edition',
  cfr95_632: '47 CFR 95.632 (MURS transmitter frequencies), 2015 annual edition',
  nwr: 'NOAA Weather Radio channel list in an open-source radio programming project (WX1-WX7)',
  marine_fr:
    'French marine VHF channel list in an open-source radio programming project (57 channels, ship/coast by 4.6 MHz offset)',
  cfr97_303h: '47 CFR 97.303(h), 60 m channels; the centre frequencies agree with a read channel list',
  marine_mfr: 'Radio maker user guide appendix "VHF Marine Channel List" (channels 1-23, transmit and receive)',
  aim_ils: 'FAA Aeronautical Information Manual, Table 1-1-4 "Frequency Pairs Allocated for ILS" (20 Apr 2023 edition)',
  tacan_forum: 'Professional pilots forum thread "Formulae Tacan channel to VOR frequency", March 2003',
  annex10_v1: 'ICAO Annex 10 Volume I, Table A (DME channelling and pairing)',
  ulysses:
    'J. D. Anderson et al., "Study of the anomalous acceleration of Pioneer 10 and 11" (2001), Ulysses link: 2111.607 MHz up, 2293.148 MHz down, factor 240/221, X-band factor 880/221',
  vgr: 'Public script quoting Voyager 1 downlink 8420.432097 MHz',
  sclist:
    'Open spacecraft carrier list in public radio-astronomy software: MSL 8402.777, MAVEN 8446.235, EMM 8401.419 MHz',
  dsn810: 'DSN Telecommunications Link Design Handbook 810-005, module 201 (frequency and channel assignments)',
} as const;

type Standing = 'seen' | 'secondary' | 'memory' | 'derived' | 'practice';
export type ChannelCase = {
  table: string;
  key: number;
  column: string;
  expected: number;
  unit: string;
  tolerance: number;
  source: keyof typeof channelSources;
  standing: Standing;
};

type Rest = Omit<ChannelCase, 'key' | 'expected'>;
const published = (rest: Rest, pairs: readonly [key: number, expected: number][]): ChannelCase[] =>
  pairs.map(([key, expected]) => ({ ...rest, key, expected }));

// prettier-ignore
export const channelCases: readonly ChannelCase[] = [
  ...published({ table: 'us-cb', column: 'frequency', unit: 'MHz', tolerance: 1e-09, source: 'cfr95_407', standing: 'seen' }, [
    [1, 26.965], [4, 27.005], [9, 27.065], [19, 27.185], [22, 27.225], [23, 27.255], [24, 27.235], [25, 27.245],
    [26, 27.265], [32, 27.325], [40, 27.405],
  ]),
  ...published({ table: 'us-fm', column: 'frequency', unit: 'MHz', tolerance: 1e-09, source: 'cfr73_501', standing: 'seen' }, [
    [200, 87.9], [206, 89.1], [220, 91.9],
  ]),
  ...published({ table: 'us-fm', column: 'frequency', unit: 'MHz', tolerance: 1e-09, source: 'cfr73_201', standing: 'seen' }, [
    [201, 88.1], [221, 92.1], [240, 95.9], [244, 96.7],
  ]),
  ...published({ table: 'us-fm', column: 'frequency', unit: 'MHz', tolerance: 1e-09, source: 'cfr73_201', standing: 'memory' }, [
    [300, 107.9],
  ]),
  ...published({ table: 'us-tv', column: 'lower', unit: 'MHz', tolerance: 1e-09, source: 'cfr73_603', standing: 'seen' }, [
    [2, 54], [3, 60], [4, 66], [5, 76], [6, 82], [7, 174], [8, 180], [9, 186], [10, 192], [11, 198], [12, 204],
    [13, 210], [14, 470], [15, 476], [17, 488], [23, 524], [37, 608], [42, 638], [50, 686], [55, 716], [69, 800],
  ]),
  ...published({ table: 'us-tv', column: 'visual', unit: 'MHz', tolerance: 1e-09, source: 'cfr73_682', standing: 'seen' }, [
    [2, 55.25], [6, 83.25], [13, 211.25],
  ]),
  ...published({ table: 'us-tv', column: 'aural', unit: 'MHz', tolerance: 1e-09, source: 'cfr73_682', standing: 'seen' }, [
    [2, 59.75], [6, 87.75],
  ]),
  ...published({ table: 'aeronautical-vhf', column: 'carrier', unit: 'MHz', tolerance: 1e-06, source: 'code833', standing: 'secondary' }, [
    [118.0, 118], [118.005, 118], [118.01, 118.00833333], [118.015, 118.01666667], [118.025, 118.025],
    [118.03, 118.025], [118.035, 118.03333333], [118.04, 118.04166667], [118.05, 118.05],
  ]),
  ...published({ table: 'aeronautical-vhf', column: 'carrier', unit: 'MHz', tolerance: 1e-06, source: 'code833', standing: 'memory' }, [
    [118.055, 118.05], [118.06, 118.05833333], [118.065, 118.06666667], [118.075, 118.075], [118.08, 118.075],
    [118.085, 118.08333333], [118.09, 118.09166667],
  ]),
  ...published({ table: 'us-frs-gmrs', column: 'frequency', unit: 'MHz', tolerance: 1e-09, source: 'frs_lists', standing: 'seen' }, [
    [1, 462.5625], [2, 462.5875], [3, 462.6125], [4, 462.6375], [5, 462.6625], [6, 462.6875], [7, 462.7125],
    [8, 467.5625], [9, 467.5875], [10, 467.6125], [11, 467.6375], [12, 467.6625], [13, 467.6875], [14, 467.7125],
    [15, 462.55], [16, 462.575], [17, 462.6], [18, 462.625], [19, 462.65], [20, 462.675], [21, 462.7], [22, 462.725],
  ]),
  ...published({ table: 'us-gmrs-repeaters', column: 'input', unit: 'MHz', tolerance: 1e-09, source: 'cfr95_29', standing: 'seen' }, [
    [15, 467.55], [16, 467.575], [17, 467.6], [18, 467.625], [19, 467.65], [20, 467.675], [21, 467.7], [22, 467.725],
  ]),
  ...published({ table: 'us-murs', column: 'frequency', unit: 'MHz', tolerance: 1e-09, source: 'cfr95_632', standing: 'seen' }, [
    [1, 151.82], [2, 151.88], [3, 151.94], [4, 154.57], [5, 154.6],
  ]),
  ...published({ table: 'us-weather', column: 'frequency', unit: 'MHz', tolerance: 1e-09, source: 'nwr', standing: 'secondary' }, [
    [1, 162.55], [2, 162.4], [3, 162.475], [4, 162.425], [5, 162.45], [6, 162.5], [7, 162.525],
  ]),
  ...published({ table: 'maritime-vhf', column: 'coast', unit: 'MHz', tolerance: 1e-09, source: 'marine_fr', standing: 'secondary' }, [
    [1, 160.65], [2, 160.7], [3, 160.75], [4, 160.8], [5, 160.85], [6, 156.3], [7, 160.95], [8, 156.4], [9, 156.45],
    [10, 156.5], [11, 156.55], [12, 156.6], [13, 156.65], [14, 156.7], [15, 156.75], [16, 156.8], [17, 156.85],
    [18, 161.5], [19, 161.55], [20, 161.6], [21, 161.65], [22, 161.7], [23, 161.75], [24, 161.8], [25, 161.85],
    [26, 161.9], [27, 161.95], [28, 162], [60, 160.625], [61, 160.675], [62, 160.725], [63, 160.775], [64, 160.825],
    [65, 160.875], [66, 160.925], [67, 156.375], [68, 156.425], [69, 156.475], [70, 156.525], [71, 156.575],
    [72, 156.625], [73, 156.675], [74, 156.725], [75, 156.775], [76, 156.825], [77, 156.875], [78, 161.525],
    [79, 161.575], [80, 161.625], [81, 161.675], [82, 161.725], [83, 161.775], [84, 161.825], [85, 161.875],
    [86, 161.925], [87, 157.375], [88, 157.425],
  ]),
  ...published({ table: 'maritime-vhf', column: 'ship', unit: 'MHz', tolerance: 1e-09, source: 'marine_mfr', standing: 'secondary' }, [
    [1, 156.05], [2, 156.1], [4, 156.2], [5, 156.25], [7, 156.35], [18, 156.9], [19, 156.95], [20, 157], [22, 157.1],
  ]),
  ...published({ table: 'ils', column: 'glide path', unit: 'MHz', tolerance: 1e-09, source: 'aim_ils', standing: 'seen' }, [
    [108.1, 334.7], [108.15, 334.55], [108.3, 334.1], [108.35, 333.95], [108.5, 329.9], [108.55, 329.75],
    [108.7, 330.5], [108.75, 330.35], [108.9, 329.3], [108.95, 329.15], [109.1, 331.4], [109.15, 331.25],
    [109.3, 332], [109.35, 331.85], [109.5, 332.6], [109.55, 332.45], [109.7, 333.2], [109.75, 333.05],
    [109.9, 333.8], [109.95, 333.65], [110.1, 334.4], [110.15, 334.25], [110.3, 335], [110.35, 334.85],
    [110.5, 329.6], [110.55, 329.45], [110.7, 330.2], [110.75, 330.05], [110.9, 330.8], [110.95, 330.65],
    [111.1, 331.7], [111.15, 331.55], [111.3, 332.3], [111.35, 332.15], [111.5, 332.9], [111.55, 332.75],
    [111.7, 333.5], [111.75, 333.35], [111.9, 331.1], [111.95, 330.95],
  ]),
  ...published({ table: 'dme-x', column: 'VHF', unit: 'MHz', tolerance: 1e-09, source: 'tacan_forum', standing: 'secondary' }, [
    [44, 110.7], [98, 115.1], [17, 108], [59, 112.2], [70, 112.3], [126, 117.9], [60, 133.3], [69, 134.2], [1, 134.4],
    [16, 135.9],
  ]),
  ...published({ table: 'dme-y', column: 'VHF', unit: 'MHz', tolerance: 1e-09, source: 'tacan_forum', standing: 'secondary' }, [
    [17, 108.05], [59, 112.25], [70, 112.35], [126, 117.95],
  ]),
  ...published({ table: 'dme-x', column: 'interrogation', unit: 'MHz', tolerance: 1e-09, source: 'annex10_v1', standing: 'memory' }, [
    [1, 1025],
  ]),
  ...published({ table: 'dme-x', column: 'reply', unit: 'MHz', tolerance: 1e-09, source: 'annex10_v1', standing: 'memory' }, [
    [1, 962], [17, 978], [63, 1024], [64, 1151], [70, 1157], [126, 1213],
  ]),
  ...published({ table: 'dme-y', column: 'reply', unit: 'MHz', tolerance: 1e-09, source: 'annex10_v1', standing: 'memory' }, [
    [17, 1104], [126, 1087],
  ]),
  ...published({ table: 'deep-space', column: 'S up', unit: 'MHz', tolerance: 0.0005, source: 'ulysses', standing: 'seen' }, [
    [9, 2111.607],
  ]),
  ...published({ table: 'deep-space', column: 'S down', unit: 'MHz', tolerance: 0.0005, source: 'ulysses', standing: 'seen' }, [
    [9, 2293.148],
  ]),
  ...published({ table: 'deep-space', column: 'X down', unit: 'MHz', tolerance: 3e-06, source: 'vgr', standing: 'secondary' }, [
    [18, 8420.432097],
  ]),
  ...published({ table: 'deep-space', column: 'X down', unit: 'MHz', tolerance: 0.001, source: 'sclist', standing: 'secondary' }, [
    [5, 8402.777], [4, 8401.419],
  ]),
  ...published({ table: 'deep-space', column: 'X down', unit: 'MHz', tolerance: 0.0005, source: 'sclist', standing: 'secondary' }, [
    [37, 8446.235],
  ]),
  ...published({ table: 'deep-space', column: 'S up', unit: 'MHz', tolerance: 3e-06, source: 'dsn810', standing: 'memory' }, [
    [5, 2110.243056], [18, 2114.676697],
  ]),
  ...published({ table: 'deep-space', column: 'S down', unit: 'MHz', tolerance: 3e-06, source: 'dsn810', standing: 'memory' }, [
    [5, 2291.666667], [18, 2296.481481],
  ]),
  ...published({ table: 'deep-space', column: 'X up', unit: 'MHz', tolerance: 3e-06, source: 'dsn810', standing: 'memory' }, [
    [3, 7149.597994],
  ]),
  ...published({ table: 'deep-space', column: 'X down', unit: 'MHz', tolerance: 3e-06, source: 'dsn810', standing: 'memory' }, [
    [3, 8400.061729],
  ]),
  ...published({ table: 'us-60m', column: 'centre', unit: 'kHz', tolerance: 1e-09, source: 'cfr97_303h', standing: 'secondary' }, [
    [1, 5332], [2, 5348], [3, 5358.5], [4, 5373], [5, 5405],
  ]),
  ...published({ table: 'us-60m', column: 'dial', unit: 'kHz', tolerance: 1e-09, source: 'cfr97_303h', standing: 'secondary' }, [
    [1, 5330.5], [2, 5346.5], [3, 5357], [4, 5371.5], [5, 5403.5],
  ]),
];
