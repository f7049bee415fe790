/** Which parts and frequencies the small converter spaces are made of: enough of each kind that every limit can be met and none is met by all. */

/** Parts that reach from the smallest to the most efficient designs of the demo's rail; one diode, bulk and power stage as the rail needs some. */
export const SMALL_PARTS: readonly string[] = [
  'GN-040-9.0',
  'SW-030-12.0',
  'SW-025-8.0',
  'SW-025-4.5',
  'KB1-18A',
  'KB1-18B',
  'KB1-18C',
  'PP6020-0.82u',
  'PP6020-1u',
  'PL6030-1.5u',
  'FG1032-1.5u',
  'MC-X5R-1210-220u-6.3',
  'MC-X5R-1206-100u-6.3',
  'MC-X7R-1206-10u-25',
  'MC-X7R-1210-22u-25',
  'SD-030-10',
  'PB-25-47u-2.8',
  'HS-025-30',
];

/** 0.5 to 1.4 MHz in steps of 100 kHz. */
export const SMALL_STEPS: readonly number[] = Array.from({ length: 10 }, (_, k) => 5e5 + 1e5 * k);
