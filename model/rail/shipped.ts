/** The shipped sheets: file names inside model/rails/. */
export const SHIPPED_RAILS: readonly string[] = [
  'buoy-sensors.yaml',
  'buoy-processor.yaml',
  'hut-link.yaml',
  'hut-shelf.yaml',
  'buoy-winch.yaml',
];
