/** The words of the foot of the window. */
export const footWords = {
  short:
    'Observations of the past at the times shown, not a forecast and not a warning. Blank water was not observed: it is not calm. Not for navigation.',
  all: 'All cautions',
  cautions: 'Before you rely on this',
  close: 'Close',
  light: 'Light',
  lights: { day: 'Day', dusk: 'Dusk', night: 'Night' },
  unit: 'Speeds in',
  units: { knots: 'knots', metresPerSecond: 'm/s' },
  about: 'About',
  aboutTitle: 'Crosstrack',
  purpose: 'A viewer of marine winds from scatterometer swath files. It works offline: nothing leaves this machine.',
  version: 'Version',
  archive: 'Archive',
  licence: 'Licence',
  licences: [
    'Crosstrack: MIT',
    'Base map: Natural Earth, public domain',
    'Faces: Atkinson Hyperlegible Next and Mono, SIL Open Font License 1.1',
    'Map drawing: MapLibre GL JS, BSD 3-Clause',
  ],
} as const;
