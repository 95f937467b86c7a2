/**
 * CMOD5.N, the C-band VV geophysical model function for equivalent-neutral 10-m wind: H. Hersbach 2010, J. Atmos. Oceanic
 * Technol. 27, 721-736, doi:10.1175/2009JTECHO698.1. Every constant and formula of this file is from there.
 */

/** What the model function needs of one incidence and wind speed: sigma0 = b0 (1 + b1 cos phi + b2 cos 2 phi)^1.6. */
export interface HarmonicTerms {
  b0: number;
  b1: number;
  b2: number;
}

/** Power to which the harmonic series is raised. */
export const HARMONIC_POWER = 1.6;

/** c1 to c28; entry 0 is not used, so that the numbers are those of the paper. */
const c = [
  0, -0.6878, -0.7957, 0.338, -0.1728, 0, 0.004, 0.1103, 0.0159, 6.7329, 2.7713, -2.2885, 0.4971, -0.725, 0.045, 0.0066,
  0.3222, 0.012, 22.7, 2.0813, 3, 8.3659, -3.3428, 1.3236, 6.2437, 2.3893, 0.3249, 4.159, 1.693,
];

const RADIANS = Math.PI / 180;

/**
 * Backscatter of the sea, linear units, from 10-m wind speed in m/s, the wind's direction (from) relative to the radar's
 * look from satellite to cell in degrees (0 = upwind), and incidence in degrees. Meant for 18 to 66 degrees, 0.2 to 50 m/s.
 */
export function modelBackscatter(speedMs: number, relativeDirectionDeg: number, incidenceDeg: number): number {
  const { b0, b1, b2 } = harmonicTerms(speedMs, incidenceDeg);
  const phi = relativeDirectionDeg * RADIANS;
  return b0 * (1 + b1 * Math.cos(phi) + b2 * Math.cos(2 * phi)) ** HARMONIC_POWER;
}

/** The three terms that do not depend on direction, for a speed in m/s and an incidence in degrees. */
export function harmonicTerms(speedMs: number, incidenceDeg: number): HarmonicTerms {
  const x = (incidenceDeg - 40) / 25;
  return { b0: isotropicTerm(speedMs, x), b1: upwindDownwindTerm(speedMs, x), b2: upwindCrosswindTerm(speedMs, x) };
}

function isotropicTerm(speedMs: number, x: number): number {
  const a0 = c[1] + c[2] * x + c[3] * x ** 2 + c[4] * x ** 3;
  const a1 = c[5] + c[6] * x;
  const a2 = c[7] + c[8] * x;
  const gamma = c[9] + c[10] * x + c[11] * x ** 2;
  const s0 = c[12] + c[13] * x;
  return 10 ** (a0 + a1 * speedMs) * lowWindShape(a2 * speedMs, s0) ** gamma;
}

/** From 57.1 degrees up s0 is not positive, the power law below it never applies and would divide by it. */
function lowWindShape(s: number, s0: number): number {
  if (s0 <= 0 || s >= s0) return logistic(s);
  return (s / s0) ** (s0 * (1 - logistic(s0))) * logistic(s0);
}

function logistic(s: number): number {
  return 1 / (1 + Math.exp(-s));
}

function upwindDownwindTerm(speedMs: number, x: number): number {
  const rise = c[14] * (1 + x) - c[15] * speedMs * (0.5 + x - Math.tanh(4 * (x + c[16] + c[17] * speedMs)));
  return rise / (1 + Math.exp(0.34 * (speedMs - c[18])));
}

function upwindCrosswindTerm(speedMs: number, x: number): number {
  const y0 = c[19];
  const n = c[20];
  const a = y0 - (y0 - 1) / n;
  const b = 1 / (n * (y0 - 1) ** (n - 1));
  const v0 = c[21] + c[22] * x + c[23] * x ** 2;
  const d1 = c[24] + c[25] * x + c[26] * x ** 2;
  const d2 = c[27] + c[28] * x;
  const y = (speedMs + v0) / v0;
  const v2 = y >= y0 ? y : a + b * (y - 1) ** n;
  return (-d1 + d2 * v2) * Math.exp(-v2);
}
