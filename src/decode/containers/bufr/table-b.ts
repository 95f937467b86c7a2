/** What a value is: a quantity, a code of a code table, a word of bits, or text. Operators change quantities only. */
export type ElementKind = 'quantity' | 'code' | 'flags' | 'text';

/** A line of table B: how one element is packed and what it is. The value is (packed + reference) / 10^scale. */
export interface TableElement {
  /** F X Y written as one number: 0 11 012 is 11012. */
  descriptor: number;
  label: string;
  unit: string;
  kind: ElementKind;
  scale: number;
  reference: number;
  widthBits: number;
}

/** The element of table B with this descriptor, or undefined where our table has none. */
export function findElement(descriptor: number): TableElement | undefined {
  return elements.get(descriptor);
}

type Line = [descriptor: number, label: string, unit: string, scale: number, reference: number, widthBits: number];

/**
 * WMO-No. 306, Manual on Codes, Volume I.2, FM 94 BUFR table B (master table 0, version 39): the elements of the
 * scatterometer sequences and a few common ones. Labels that name a producer or instrument there are neutral here.
 */
const lines: Line[] = [
  [1001, 'WMO block number', 'number', 0, 0, 7],
  [1002, 'WMO station number', 'number', 0, 0, 10],
  [1007, 'Satellite identifier', 'code table', 0, 0, 10],
  [1012, 'Direction of motion of moving observing platform', 'deg', 0, 0, 9],
  [1015, 'Station or site name', 'text', 0, 0, 160],
  [1032, 'Generating application', 'code table', 0, 0, 8],
  [1033, 'Identification of originating/generating centre', 'code table', 0, 0, 8],
  [1034, 'Identification of originating/generating sub-centre', 'code table', 0, 0, 8],
  [1041, 'Absolute platform velocity - first component', 'm/s', 5, -1073741824, 31],
  [1042, 'Absolute platform velocity - second component', 'm/s', 5, -1073741824, 31],
  [1043, 'Absolute platform velocity - third component', 'm/s', 5, -1073741824, 31],
  [2019, 'Satellite instruments', 'code table', 0, 0, 11],
  [2021, 'Satellite instrument data used in processing', 'flag table', 0, 0, 9],
  [2026, 'Cross-track resolution', 'm', 2, 0, 12],
  [2027, 'Along-track resolution', 'm', 2, 0, 12],
  [2048, 'Satellite sensor indicator', 'code table', 0, 0, 4],
  [2104, 'Antenna polarization', 'code table', 0, 0, 4],
  [2111, 'Radar incidence angle', 'deg', 1, 0, 10],
  [2112, 'Radar look angle', 'deg', 1, 0, 12],
  [2134, 'Antenna beam azimuth', 'deg', 2, 0, 16],
  [4001, 'Year', 'a', 0, 0, 12],
  [4002, 'Month', 'mon', 0, 0, 4],
  [4003, 'Day', 'd', 0, 0, 6],
  [4004, 'Hour', 'h', 0, 0, 5],
  [4005, 'Minute', 'min', 0, 0, 6],
  [4006, 'Second', 's', 0, 0, 6],
  [5001, 'Latitude (high accuracy)', 'deg', 5, -9000000, 25],
  [5002, 'Latitude (coarse accuracy)', 'deg', 2, -9000, 15],
  [5033, 'Pixel size on horizontal - 1', 'm', -1, 0, 16],
  [5034, 'Along track row number', 'number', 0, 0, 11],
  [5040, 'Orbit number', 'number', 0, 0, 24],
  [6001, 'Longitude (high accuracy)', 'deg', 5, -18000000, 26],
  [6002, 'Longitude (coarse accuracy)', 'deg', 2, -18000, 16],
  [6034, 'Cross-track cell number', 'number', 0, 0, 7],
  [7001, 'Height of station', 'm', 0, -400, 15],
  [8018, 'Land/ice surface type', 'flag table', 0, 0, 17],
  [8022, 'Total number (with respect to accumulation or average)', 'number', 0, 0, 16],
  [8025, 'Time difference qualifier', 'code table', 0, 0, 4],
  [8085, 'Beam identifier', 'code table', 0, 0, 3],
  [10031, "In direction of the north pole, distance from the Earth's centre", 'm', 2, -1073741824, 31],
  [10095, 'Height of atmosphere used', 'm', 0, 0, 16],
  [11011, 'Wind direction at 10 m', 'deg', 0, 0, 9],
  [11012, 'Wind speed at 10 m', 'm/s', 1, 0, 12],
  [11052, 'Formal uncertainty in wind speed', 'm/s', 2, 0, 13],
  [11053, 'Formal uncertainty in wind direction', 'deg', 2, 0, 15],
  [11081, 'Model wind direction at 10 m', 'deg', 2, 0, 16],
  [11082, 'Model wind speed at 10 m', 'm/s', 2, 0, 14],
  [12063, 'Brightness temperature', 'K', 1, 0, 12],
  [12065, 'Standard deviation brightness temperature', 'K', 1, 0, 12],
  [12101, 'Temperature', 'K', 2, 0, 16],
  [13055, 'Intensity of precipitation', 'kg m-2 s-1', 4, 0, 8],
  [20065, 'Snow cover', '%', 0, 0, 7],
  [20095, 'Ice probability', 'number', 3, 0, 10],
  [20096, 'Ice age (A parameter)', 'dB', 2, -4096, 13],
  [21062, 'Backscatter', 'dB', 2, -5000, 13],
  [21063, 'Radiometric resolution (noise value)', '%', 1, 0, 10],
  [21065, 'Missing packet counter', 'number', 0, -127, 8],
  [21067, 'Wind product confidence data', 'flag table', 0, 0, 13],
  [21088, 'Wet backscatter', 'dB', 2, -5000, 13],
  [21101, 'Number of vector ambiguities', 'number', 0, 0, 3],
  [21102, 'Index of selected wind vector', 'number', 0, 0, 3],
  [21103, 'Total number of sigma-0 measurements', 'number', 0, 0, 5],
  [21104, 'Likelihood computed for solution', 'number', 3, -30000, 15],
  [21105, 'Normalized radar cross-section', 'dB', 2, -10000, 14],
  [21106, 'Kp variance coefficient (alpha)', 'number', 3, 0, 14],
  [21107, 'Kp variance coefficient (beta)', 'number', 8, 0, 16],
  [21109, 'Wind vector cell quality (17-bit, pencil beam)', 'flag table', 0, 0, 17],
  [21110, 'Number of inner-beam sigma-0 (forward of satellite)', 'number', 0, 0, 6],
  [21111, 'Number of outer-beam sigma-0 (forward of satellite)', 'number', 0, 0, 6],
  [21112, 'Number of inner-beam sigma-0 (aft of satellite)', 'number', 0, 0, 6],
  [21113, 'Number of outer-beam sigma-0 (aft of satellite)', 'number', 0, 0, 6],
  [21114, 'Kp variance coefficient (gamma)', 'dB', 3, -140000, 18],
  [21115, 'Sigma-0 quality', 'flag table', 0, 0, 17],
  [21116, 'Sigma-0 mode', 'flag table', 0, 0, 17],
  [21117, 'Sigma-0 variance quality control', 'number', 2, 0, 16],
  [21118, 'Attenuation correction on sigma-0', 'dB', 2, -10000, 14],
  [21119, 'Wind scatterometer geophysical model function', 'code table', 0, 0, 6],
  [21120, 'Probability of rain', 'number', 3, 0, 10],
  [21121, 'Rain index (normalised objective function)', 'number', 0, 0, 8],
  [21122, 'Attenuation correction on sigma-0 (from brightness temperature)', 'dB', 2, -10000, 14],
  [21123, 'Normalized radar cross-section (wide range)', 'dB', 2, -30000, 15],
  [21150, 'Beam co-location', 'code table', 0, 0, 2],
  [21151, 'Estimated error in sigma-0 at 40 degrees incidence angle', 'dB', 2, 0, 9],
  [21152, 'Slope at 40 degrees incidence angle', 'dB/deg', 2, -80, 7],
  [21153, 'Estimated error in slope at 40 degrees incidence angle', 'dB/deg', 2, -40, 6],
  [21154, 'Soil moisture sensitivity', 'dB', 2, 0, 12],
  [21155, 'Wind vector cell quality (24-bit)', 'flag table', 0, 0, 24],
  [21156, 'Backscatter distance', 'number', 1, -4096, 13],
  [21157, 'Loss per unit length of atmosphere used', 'dB/m', 10, 0, 22],
  [21158, 'Kp estimate quality', 'code table', 0, 0, 2],
  [21159, 'Sigma-0 usability', 'code table', 0, 0, 2],
  [21160, 'Use of synthetic data', 'number', 3, 0, 10],
  [21161, 'Synthetic data quantity', 'number', 3, 0, 10],
  [21162, 'Platform orbit and attitude quality', 'number', 3, 0, 10],
  [21163, 'Solar array reflection contamination', 'number', 3, 0, 10],
  [21164, 'Telemetry presence and quality', 'number', 3, 0, 10],
  [21165, 'Extrapolated reference function presence', 'number', 3, 0, 10],
  [21166, 'Land fraction', 'number', 3, 0, 10],
  [25060, 'Software identification', 'number', 0, 0, 14],
  [25062, 'Database identification', 'number', 0, 0, 14],
  [27031, "In direction of 0 degrees longitude, distance from the Earth's centre", 'm', 2, -1073741824, 31],
  [28031, "In direction 90 degrees east, distance from the Earth's centre", 'm', 2, -1073741824, 31],
  [31000, 'Short delayed descriptor replication factor', 'number', 0, 0, 1],
  [31001, 'Delayed descriptor replication factor', 'number', 0, 0, 8],
  [31002, 'Extended delayed descriptor replication factor', 'number', 0, 0, 16],
  [33055, 'Wind vector quality flag (24-bit)', 'flag table', 0, 0, 24],
  [40001, 'Surface soil moisture (ms)', '%', 1, 0, 10],
  [40002, 'Estimated error in surface soil moisture', '%', 1, 0, 10],
  [40003, 'Mean surface soil moisture', 'number', 3, 0, 10],
  [40004, 'Rain fall detection', 'number', 3, 0, 10],
  [40005, 'Soil moisture correction flag', 'flag table', 0, 0, 8],
  [40006, 'Soil moisture processing flag', 'flag table', 0, 0, 16],
  [40007, 'Soil moisture quality', '%', 1, 0, 10],
  [40008, 'Frozen land surface fraction', '%', 1, 0, 10],
  [40009, 'Inundation and wetland fraction', '%', 1, 0, 10],
  [40010, 'Topographic complexity', '%', 1, 0, 10],
];

const kindOfUnit: Record<string, ElementKind> = { 'code table': 'code', 'flag table': 'flags', text: 'text' };

const elements = new Map<number, TableElement>(
  lines.map(([descriptor, label, unit, scale, reference, widthBits]) => [
    descriptor,
    { descriptor, label, unit, kind: kindOfUnit[unit] ?? 'quantity', scale, reference, widthBits },
  ]),
);
