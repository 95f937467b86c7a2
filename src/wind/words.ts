import { normaliseDegrees, normaliseLongitude, toWholeKnots } from './units.ts';

/** A position in whole minutes with hemisphere letters: '52°31′S 78°37′E'. */
export function formatPosition(lon: number, lat: number): string {
  return `${formatAngle(lat, 'N', 'S', 2)} ${formatAngle(normaliseLongitude(lon), 'E', 'W', 3)}`;
}

function formatAngle(degrees: number, positive: string, negative: string, width: number): string {
  const minutes = Math.round(Math.abs(degrees) * 60);
  const whole = String(Math.floor(minutes / 60)).padStart(width, '0');
  return `${whole}°${String(minutes % 60).padStart(2, '0')}′${degrees < 0 && minutes > 0 ? negative : positive}`;
}

/** A speed in the user's unit: whole knots, '54 kt', or metres per second in tenths, '27.9 m/s'. */
export function formatSpeed(speedMs: number, unit: 'knots' | 'metresPerSecond'): string {
  return unit === 'knots' ? `${toWholeKnots(speedMs)} kt` : `${speedMs.toFixed(1)} m/s`;
}

/** A direction as three digits, north as 360 as coded reports say it: '268°'. */
export function formatDirection(degrees: number): string {
  const whole = Math.round(normaliseDegrees(degrees)) % 360;
  return `${String(whole === 0 ? 360 : whole).padStart(3, '0')}°`;
}

/** Clock time UTC: '01:19'. */
export function formatClock(timeMs: number): string {
  return new Date(timeMs).toISOString().slice(11, 16);
}

/** Clock time UTC with seconds: '01:19:33'. */
export function formatClockSeconds(timeMs: number): string {
  return new Date(timeMs).toISOString().slice(11, 19);
}

/** Date UTC: '2031-01-17'. */
export function formatDate(timeMs: number): string {
  return new Date(timeMs).toISOString().slice(0, 10);
}

/** An age in words: 'just now', '41 min ago', '2 h 41 min ago', '3 days 4 h ago'; of a later time 'in 12 min'. */
export function formatAge(timeMs: number, nowMs: number): string {
  const minutes = Math.round(Math.abs(nowMs - timeMs) / 60_000);
  if (minutes === 0) return 'just now';
  const length = formatLength(minutes);
  return timeMs <= nowMs ? `${length} ago` : `in ${length}`;
}

function formatLength(minutes: number): string {
  if (minutes < 60) return `${minutes} min`;
  if (minutes < 48 * 60)
    return minutes % 60 ? `${Math.floor(minutes / 60)} h ${minutes % 60} min` : `${minutes / 60} h`;
  const days = Math.floor(minutes / 1440);
  if (days >= 730) return `${Math.floor(days / 365.25)} years`;
  const hours = Math.floor((minutes % 1440) / 60);
  return hours && days < 30 ? `${days} days ${hours} h` : `${days} days`;
}
