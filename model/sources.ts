/** Every published source that a formula or a check of the model rests on: named by id in docstrings and in checks. */

/** One source in print. */
export interface Source {
  readonly author: string;
  readonly title: string;
  readonly year: number;
  /** Where it appeared. */
  readonly place: string;
}

/** The registry, by id. */
export const SOURCES = {
  'abramowitz-stegun': {
    author: 'M. Abramowitz, I. A. Stegun (editors)',
    title: 'Handbook of Mathematical Functions',
    year: 1964,
    place: 'National Bureau of Standards, Applied Mathematics Series 55',
  },
  'astm-b258': {
    author: 'ASTM International',
    title: 'Standard Specification for Standard Nominal Diameters and Cross-Sectional Areas of AWG Sizes',
    year: 2018,
    place: 'ASTM B258',
  },
  'balogh-dn63': {
    author: 'L. Balogh',
    title: 'The current-doubler rectifier: an alternative rectification technique for push-pull and bridge converters',
    year: 1994,
    place: 'Unitrode design note DN-63',
  },
  'burkart-kolar-2013': {
    author: 'R. Burkart, J. W. Kolar',
    title: 'Component cost models for multi-objective optimizations of switched-mode power converters',
    year: 2013,
    place: 'IEEE ECCE, pp. 2139-2146',
  },
  'cec-weights': {
    author: 'California Energy Commission',
    title: 'Performance test protocol for evaluating inverters used in grid-connected photovoltaic systems',
    year: 2004,
    place: 'weighted efficiency',
  },
  'churchill-1977': {
    author: 'S. W. Churchill',
    title: 'A comprehensive correlating equation for laminar, assisting, forced and free convection',
    year: 1977,
    place: 'AIChE Journal 23, pp. 10-16',
  },
  'derating-curves-2025': {
    author: 'CDFER',
    title: 'Ceramic-Capacitor-Derating: collected bias curves',
    year: 2025,
    place: 'public repository, MIT licence',
  },
  'dowell-1966': {
    author: 'P. L. Dowell',
    title: 'Effects of eddy currents in transformer windings',
    year: 1966,
    place: 'Proceedings of the IEE 113, pp. 1387-1394',
  },
  'drofenik-kolar': {
    author: 'U. Drofenik, J. W. Kolar',
    title: 'Analyzing the theoretical limits of forced air-cooling by employing advanced composite materials',
    year: 2006,
    place: 'International Conference on Integrated Power Systems',
  },
  'erickson-maksimovic-2001': {
    author: 'R. W. Erickson, D. Maksimović',
    title: 'Fundamentals of Power Electronics',
    year: 2001,
    place: 'Kluwer, 2nd edition',
  },
  'eu-2019-1782': {
    author: 'European Commission',
    title: 'Ecodesign requirements for external power supplies',
    year: 2019,
    place: 'Regulation (EU) 2019/1782',
  },
  'european-weights': {
    author: 'R. Hotopp; Joint Research Centre, Ispra',
    title: 'European efficiency of photovoltaic inverters',
    year: 1991,
    place: 'weighted efficiency, as printed in inverter data sheets',
  },
  'ferreira-1994': {
    author: 'J. A. Ferreira',
    title: 'Improved analytical modeling of conductive losses in magnetic components',
    year: 1994,
    place: 'IEEE Transactions on Power Electronics 9, pp. 127-131',
  },
  'ferroxcube-2008': {
    author: 'Ferroxcube',
    title: 'Soft Ferrites and Accessories: data sheets of ETD29 and RM8/I',
    year: 2008,
    place: 'data handbook',
  },
  'guillod-2017': {
    author: 'T. Guillod, J. Huber, F. Krismer, J. W. Kolar',
    title: 'Litz wire losses: effects of twisting imperfections',
    year: 2017,
    place: 'IEEE COMPEL',
  },
  'guillod-2023': {
    author: 'T. Guillod, J. S. Lee, H. Li, S. Wang, M. Chen, C. R. Sullivan',
    title: 'Calculation of ferrite core losses with arbitrary waveforms using the composite waveform hypothesis',
    year: 2023,
    place: 'IEEE APEC, with its open data and webinar code',
  },
  'hart-2011': { author: 'D. W. Hart', title: 'Power Electronics', year: 2011, place: 'McGraw-Hill' },
  'holman-2010': { author: 'J. P. Holman', title: 'Heat Transfer', year: 2010, place: 'McGraw-Hill, 10th edition' },
  'hurley-2000': {
    author: 'W. G. Hurley, E. Gath, J. G. Breslin',
    title: 'Optimizing the ac resistance of multilayer transformer windings with arbitrary current waveforms',
    year: 2000,
    place: 'IEEE Transactions on Power Electronics 15, pp. 369-376',
  },
  'iec-60028': {
    author: 'IEC',
    title: 'International standard of resistance for copper',
    year: 1925,
    place: 'IEC 60028',
  },
  'iec-60205': {
    author: 'IEC',
    title: 'Calculation of the effective parameters of magnetic piece parts',
    year: 2016,
    place: 'IEC 60205',
  },
  'iec-63093': {
    author: 'IEC; values from makers’ data sheets',
    title: 'Ferrite cores: guidelines on dimensions',
    year: 2018,
    place: 'IEC 63093 series',
  },
  'igse-2002': {
    author: 'K. Venkatachalam, C. R. Sullivan, T. Abdallah, H. Tacca',
    title: 'Accurate prediction of ferrite core loss with nonsinusoidal waveforms using only Steinmetz parameters',
    year: 2002,
    place: 'IEEE COMPEL',
  },
  isl6366: { author: 'Intersil', title: 'ISL6366 data sheet', year: 2013, place: 'page 38, equations 49 to 51' },
  'jedec-coss': {
    author: 'JEDEC',
    title: 'Definitions of time- and energy-related output capacitance',
    year: 2014,
    place: 'as printed in transistor data sheets',
  },
  'kasper-2016': {
    author: 'M. Kasper, R. Burkart, G. Deboy, J. W. Kolar',
    title: 'ZVS of power MOSFETs revisited',
    year: 2016,
    place: 'IEEE Transactions on Power Electronics 31, pp. 8063-8067',
  },
  'lanczos-1964': {
    author: 'C. Lanczos',
    title: 'A precision approximation of the gamma function',
    year: 1964,
    place: 'SIAM Journal on Numerical Analysis B 1, pp. 86-96',
  },
  'lee-1995': {
    author: 'S. Lee',
    title: 'How to select a heat sink',
    year: 1995,
    place: 'Electronics Cooling 1, pp. 10-14',
  },
  lm5036: { author: 'Texas Instruments', title: 'LM5036 data sheet', year: 2018, place: 'design section' },
  ltc1698: { author: 'Linear Technology', title: 'LTC1698 data sheet', year: 2000, place: 'page 16' },
  ltc3728: { author: 'Linear Technology', title: 'LTC3728 data sheet', year: 2002, place: 'page 28' },
  ltc3729: { author: 'Linear Technology', title: 'LTC3729 data sheet', year: 2001, place: 'pages 14 and 15' },
  'magnet-2021': {
    author: 'H. Li and others (Princeton, Dartmouth)',
    title: 'MagNet: core-loss measurements and fitted parameters',
    year: 2021,
    place: 'public repository, MIT licence',
  },
  'mclyman-2004': {
    author: 'C. W. T. McLyman',
    title: 'Transformer and Inductor Design Handbook',
    year: 2004,
    place: 'Marcel Dekker, 3rd edition',
  },
  'middlebrook-1976': {
    author: 'R. D. Middlebrook',
    title: 'Input filter considerations in design and application of switching regulators',
    year: 1976,
    place: 'IEEE Industry Applications Society Annual Meeting',
  },
  'nbs-74': {
    author: 'National Bureau of Standards',
    title: 'Radio Instruments and Measurements (skin effect table)',
    year: 1937,
    place: 'Circular C74',
  },
  ncp5314: { author: 'ON Semiconductor', title: 'NCP5314 data sheet', year: 2006, place: 'page 20' },
  'neher-mcgrath-1957': {
    author: 'J. H. Neher, M. H. McGrath',
    title: 'The calculation of the temperature rise and load capability of cable systems',
    year: 1957,
    place: 'AIEE Transactions 76, table III',
  },
  'qiu-2004': {
    author: 'Y. Qiu, K. Yao, Y. Meng, M. Xu, F. C. Lee, M. Ye',
    title: 'Control-loop bandwidth limitations for multiphase interleaving buck converters',
    year: 2004,
    place: 'IEEE APEC',
  },
  'rashid-2014': { author: 'M. H. Rashid', title: 'Power Electronics', year: 2014, place: 'Pearson, 4th edition' },
  'ren-2006': {
    author: 'Y. Ren, M. Xu, J. Zhou, F. C. Lee',
    title: 'Analytical loss model of power MOSFET',
    year: 2006,
    place: 'IEEE Transactions on Power Electronics 21, pp. 310-319',
  },
  'rohm-64an035e': { author: 'ROHM', title: 'Efficiency of buck converter', year: 2016, place: 'note 64AN035E' },
  'rohm-aek59': {
    author: 'ROHM',
    title: 'Calculation of power loss (synchronous)',
    year: 2016,
    place: 'note AEK59-D1-0065-2',
  },
  'sabate-1990': {
    author: 'J. A. Sabaté, V. Vlatković, R. B. Ridley, F. C. Lee, B. H. Cho',
    title: 'Design considerations for high-voltage high-power full-bridge zero-voltage-switched PWM converter',
    year: 1990,
    place: 'IEEE APEC, pp. 275-284',
  },
  slus660h: {
    author: 'Texas Instruments',
    title: 'TPS40140 data sheet',
    year: 2013,
    place: 'SLUS660H, pages 43 to 51',
  },
  slus964a: { author: 'Texas Instruments', title: 'TPS40303 data sheet', year: 2010, place: 'SLUS964A, page 15' },
  slva057: {
    author: 'Texas Instruments',
    title: 'Understanding buck power stages in switchmode power supplies',
    year: 1999,
    place: 'SLVA057',
  },
  slvsb16b: { author: 'Texas Instruments', title: 'TPS43340-Q1 data sheet', year: 2013, place: 'SLVSB16B, page 29' },
  'snelling-1988': { author: 'E. C. Snelling', title: 'Soft Ferrites', year: 1988, place: 'Butterworths, 2nd edition' },
  'venable-1983': {
    author: 'H. D. Venable',
    title: 'The k-factor: a new mathematical tool for stability analysis and synthesis',
    year: 1983,
    place: 'Proceedings of Powercon 10',
  },
} as const satisfies Record<string, Source>;

/** Id of a source. */
export type SourceId = keyof typeof SOURCES;
