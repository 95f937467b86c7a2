import type { Swath } from '../swath/swath.ts';
import { makeFanBeamPass } from './fan-beam-pass.ts';
import { makePencilBeamPass } from './pencil-beam-pass.ts';
import { rainAt, type Storm, windAt } from './storm.ts';
import { type Polygons, rasterLand, type Surface } from './surface.ts';

/** The three passes of the demonstration and the moment at which its watch stands. */
export interface DemonstrationWatch {
  firstFanBeam: Swath;
  pencilBeam: Swath;
  secondFanBeam: Swath;
  nowMs: number;
}

/** When the demonstration's watch stands: 46 minutes after the middle of its newest pass. */
export const demonstrationNowMs = Date.UTC(2031, 0, 17, 17, 58);

/** What the demonstration is called wherever it is shown. */
export const demonstrationTitle = 'A winter storm on the date line: invented data';

/** The view that the demonstration opens with: the storm, the islands, and the water that nobody looked at. */
export const demonstrationView = { lon: -178, lat: 51.5, zoom: 3.9 };

/** Platform numbers that are not assigned in common code table C-5, as the passes are invented. */
const platformCodes = { firstFanBeam: 901, secondFanBeam: 902, pencilBeam: 903 };

/** The invented storm: it crosses the date line from west to east between the first pass and the last. */
export const storm: Storm = {
  start: { timeMs: Date.UTC(2031, 0, 17, 7, 50), lon: 174.4, lat: 51.9 },
  courseDeg: 61,
  speedKmPerHour: 49,
  vortexMs: 21.2,
  vortexGrowthMsPerHour: 0.3,
  radiusKm: 190,
  frontTurnDeg: 30,
  high: { lon: -167, lat: 44.5 },
  smallLow: { lon: -167.8, lat: 57.6, strongestMs: 16, radiusKm: 150 },
};

/** What a model believes of it: too far on, too weak, too smooth, and without the small low. */
const modelStorm: Storm = {
  ...storm,
  start: { ...storm.start, lon: 176.3, lat: 52.5 },
  vortexMs: 18,
  radiusKm: 230,
  frontTurnDeg: 18,
  high: { lon: -169, lat: 45.5 },
  smallLow: null,
};

/** The wind of the demonstration at a place and time. */
export function trueWindAt(lon: number, lat: number, timeMs: number) {
  return windAt(storm, lon, lat, timeMs);
}

function modelWindAt(lon: number, lat: number, timeMs: number) {
  return windAt(modelStorm, lon, lat, timeMs);
}

/** Makes the demonstration's passes over the real coastline given; the same every time. */
export function makeDemonstrationWatch(land: Polygons): DemonstrationWatch {
  const surface: Surface = {
    isLand: rasterLand(land, { west: 140, south: 30, widthDeg: 85, heightDeg: 40 }, 0.02),
    isIce: (lon, lat) => lat > 61.3 + 0.8 * Math.sin((lon * Math.PI) / 9),
  };
  const sea = { windAt: trueWindAt, modelWindAt, surface };
  return {
    firstFanBeam: makeFanBeamPass({
      ...sea,
      crossing: { lon: -174.8, lat: 50.5, timeMs: Date.UTC(2031, 0, 17, 7, 50), isAscending: true },
      rows: 112,
      rowsWithoutForeLook: [22, 24],
      seed: 20_310_117,
      platformCode: platformCodes.firstFanBeam,
    }),
    pencilBeam: makePencilBeamPass({
      ...sea,
      crossing: { lon: 176.8, lat: 50.5, timeMs: Date.UTC(2031, 0, 17, 15, 49), isAscending: false },
      rows: 112,
      rainAt: (lon, lat, timeMs) => rainAt(storm, lon, lat, timeMs),
      seed: 20_310_118,
      platformCode: platformCodes.pencilBeam,
    }),
    secondFanBeam: makeFanBeamPass({
      ...sea,
      crossing: { lon: -171.4, lat: 50.5, timeMs: Date.UTC(2031, 0, 17, 17, 12), isAscending: false },
      rows: 112,
      rowsWithoutForeLook: [98, 100],
      seed: 20_310_119,
      platformCode: platformCodes.secondFanBeam,
    }),
    nowMs: demonstrationNowMs,
  };
}
