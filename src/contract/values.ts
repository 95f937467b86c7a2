import { z } from 'zod';

/** A moment, milliseconds since 1970-01-01 UTC. */
export const moment = z.number().int().min(-8.64e15).max(8.64e15);

/** A span of time, both ends included. */
export const timeWindow = z.object({ fromMs: moment, toMs: moment }).refine((window) => window.fromMs <= window.toMs, {
  message: 'the window ends before it begins',
});
export type TimeWindow = z.infer<typeof timeWindow>;

/** A box in degrees; west > east when it crosses the date line; 360 wide when west = -180 and east = 180. */
export const geoBox = z.object({
  west: z.number().min(-180).max(180),
  south: z.number().min(-90).max(90),
  east: z.number().min(-180).max(180),
  north: z.number().min(-90).max(90),
});
export type GeoBox = z.infer<typeof geoBox>;

/** A position in degrees: lon, then lat (RFC 7946 section 3.1.1). */
export const position = z.tuple([z.number().min(-360).max(360), z.number().min(-90).max(90)]);

/** The water that the watch speaks of: a named area the user keeps, or the view. */
export const watchWater = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('view'), box: geoBox }),
  z.object({ kind: z.literal('area'), areaId: z.number().int().positive() }),
]);
export type WatchWater = z.infer<typeof watchWater>;

/** A watch area: its ring (first position not repeated), edges straight in longitude and latitude, the short way round. */
export const watchArea = z.object({
  areaId: z.number().int().positive(),
  name: z.string().min(1).max(80),
  ring: z.array(position).min(3).max(500),
});
export type WatchArea = z.infer<typeof watchArea>;

export const switches = z.object({
  beaufortShown: z.array(z.boolean()).length(13),
  doubtShown: z.object({ rain: z.boolean(), land: z.boolean(), ice: z.boolean(), quality: z.boolean() }),
});

/** What the user sees and chose, kept so that a reload finds everything as it was. */
export const settings = z.object({
  camera: z
    .object({ lon: z.number(), lat: z.number(), zoom: z.number().min(0).max(24), bearing: z.number() })
    .nullable(),
  /** A set clock, or null for the system's. */
  setClockMs: moment.nullable(),
  /** How far back from now the window reaches. */
  windowHours: z
    .number()
    .min(0.25)
    .max(24 * 366),
  switches,
  hiddenPassIds: z.array(z.number().int()),
  speedUnit: z.enum(['knots', 'metresPerSecond']),
  light: z.enum(['day', 'dusk', 'night']),
  watchAreaId: z.number().int().positive().nullable(),
});
export type Settings = z.infer<typeof settings>;

/** One pass as the list shows it. */
export const passSummary = z.object({
  passId: z.number().int(),
  file: z.string(),
  fileHash: z.string(),
  partOfFile: z.number().int(),
  startMs: moment,
  endMs: moment,
  band: z.enum(['C', 'Ku']).nullable(),
  viewing: z.enum(['fan-beam', 'pencil-beam']).nullable(),
  platformCode: z.number().int().nullable(),
  sourceAsRead: z.string().nullable(),
  rows: z.number().int(),
  columns: z.number().int(),
  cellSizeM: z.number().nullable(),
  cells: z.number().int(),
  winds: z.number().int(),
  galeWinds: z.number().int(),
  maxSpeedMs: z.number().nullable(),
  maxLon: z.number().nullable(),
  maxLat: z.number().nullable(),
  maxTimeMs: moment.nullable(),
  maxRow: z.number().int().nullable(),
  maxColumn: z.number().int().nullable(),
  flagReading: z.enum(['as-table', 'one-bit-lower', 'as-file-states', 'unknown', 'absent']),
  isDirectionStated: z.boolean(),
  checksRain: z.boolean(),
  notes: z.array(z.string()),
  isDemonstration: z.boolean(),
  loadedAtMs: moment,
});
export type PassSummary = z.infer<typeof passSummary>;

/** A problem as it crosses to the screen or the terminal. */
export const toldProblem = z.object({ code: z.string(), message: z.string(), where: z.string() });
export type ToldProblem = z.infer<typeof toldProblem>;

/** What became of one file. */
export const fileFate = z.object({
  file: z.string(),
  fate: z.enum(['loaded', 'already there', 'partly read', 'refused']),
  passIds: z.array(z.number().int()),
  problems: z.array(toldProblem),
});
export type FileFate = z.infer<typeof fileFate>;

/** One possible wind of a cell. */
export const cellSolution = z.object({
  speedMs: z.number(),
  directionFrom: z.number().nullable(),
  probability: z.number().nullable(),
  fitDistance: z.number().nullable(),
  isChosen: z.boolean(),
});

/** Everything known of one cell. null is 'the file does not say'. */
export const cellCard = z.object({
  passId: z.number().int(),
  file: z.string(),
  /** Counted from 1. */
  row: z.number().int(),
  /** Counted from 1. */
  column: z.number().int(),
  state: z.enum(['wind', 'looked but no wind', 'never looked']),
  lon: z.number(),
  lat: z.number(),
  timeMs: moment,
  speedMs: z.number().nullable(),
  directionFrom: z.number().nullable(),
  isDirectionStated: z.boolean(),
  flagWords: z.array(z.string()),
  flagReading: passSummary.shape.flagReading,
  checksRain: z.boolean(),
  rawFlags: z.number().nullable(),
  chosenSolution: z.number().int(),
  solutions: z.array(cellSolution),
  beams: z.array(
    z.object({
      incidenceDeg: z.number().nullable(),
      azimuthDeg: z.number().nullable(),
      backscatterDb: z.number().nullable(),
      noisePercent: z.number().nullable(),
    }),
  ),
  background: z.object({ speedMs: z.number(), directionFrom: z.number().nullable() }).nullable(),
  iceProbability: z.number().nullable(),
  cellSizeM: z.number().nullable(),
  band: passSummary.shape.band,
  viewing: passSummary.shape.viewing,
  /** Distance and compass bearing to the nearest land of the base map, or null when none lies within 1,000 km. */
  nearestLand: z.object({ distanceKm: z.number(), bearingDeg: z.number() }).nullable(),
  /** What a reader must know before believing this cell, in plain sentences. */
  cautions: z.array(z.string()),
});
export type CellCard = z.infer<typeof cellCard>;

/** One run of the watch line. `goesTo` names what pressing it shows; plain text has none. */
export const watchRun = z.object({
  text: z.string(),
  weight: z.enum(['plain', 'figure', 'danger']),
  goesTo: z
    .discriminatedUnion('kind', [
      z.object({
        kind: z.literal('cell'),
        passId: z.number().int(),
        row: z.number().int(),
        column: z.number().int(),
        lon: z.number(),
        lat: z.number(),
      }),
      z.object({ kind: z.literal('unseen') }),
      z.object({ kind: z.literal('hidden winds') }),
      z.object({ kind: z.literal('passes') }),
      z.object({ kind: z.literal('water') }),
    ])
    .nullable(),
});
export type WatchRun = z.infer<typeof watchRun>;

/** The watch: its sentence and the figures behind it. */
export const watchReport = z.object({
  runs: z.array(watchRun),
  seaKm2: z.number(),
  /** Share of the sea outside every footprint in the window, 0 to 1; null where the water holds no sea. */
  unseenShare: z.number().nullable(),
  /** Share of the sea that was looked at without a wind, 0 to 1. */
  noWindShare: z.number().nullable(),
  winds: z.number().int(),
  galeWinds: z.number().int(),
  /** Winds of gale force or more in this water and window that the switches or hidden passes keep off the chart. */
  hiddenGaleWinds: z.number().int(),
  strongest: z
    .object({
      speedMs: z.number(),
      directionFrom: z.number().nullable(),
      lon: z.number(),
      lat: z.number(),
      timeMs: moment,
      passId: z.number().int(),
      row: z.number().int(),
      column: z.number().int(),
      isHidden: z.boolean(),
    })
    .nullable(),
  oldestMs: moment.nullable(),
  newestMs: moment.nullable(),
  /** How much of this water each pass saw, newest first. */
  passes: z.array(z.object({ passId: z.number().int(), seenShare: z.number(), startMs: moment, endMs: moment })),
});
export type WatchReport = z.infer<typeof watchReport>;
