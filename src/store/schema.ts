/** Marks a database as an archive of this program: the letters 'XTrk' in the file's header (SQLite file format 1.3.13). */
export const APPLICATION_ID = 0x5854726b;

/**
 * The way from each schema version to the next: entry n brings version n to n + 1. An entry that was ever released is
 * never changed; a new need is a new entry. Column names are the names of the model.
 *
 * What the chart draws stands alone in blocks.drawing; details, solutions, beams and background have tables of their own,
 * so that drawing never reads their pages.
 */
export const migrations: readonly string[] = [
  `
  CREATE TABLE files (
    fileId INTEGER PRIMARY KEY,
    hash TEXT NOT NULL UNIQUE,
    name TEXT NOT NULL,
    bytes INTEGER NOT NULL,
    parts INTEGER NOT NULL,
    isDemonstration INTEGER NOT NULL,
    loadedAtMs INTEGER NOT NULL
  ) STRICT;

  CREATE TABLE passes (
    passId INTEGER PRIMARY KEY AUTOINCREMENT,
    fileId INTEGER NOT NULL REFERENCES files ON DELETE CASCADE,
    partOfFile INTEGER NOT NULL,
    startMs INTEGER NOT NULL,
    endMs INTEGER NOT NULL,
    band TEXT,
    viewing TEXT,
    platformCode INTEGER,
    sourceAsRead TEXT,
    rows INTEGER NOT NULL,
    columns INTEGER NOT NULL,
    cellSizeM REAL,
    cells INTEGER NOT NULL,
    winds INTEGER NOT NULL,
    galeWinds INTEGER NOT NULL,
    maxSpeedMs REAL,
    maxLon REAL,
    maxLat REAL,
    maxTimeMs INTEGER,
    maxRow INTEGER,
    maxColumn INTEGER,
    flagReading TEXT NOT NULL,
    isDirectionStated INTEGER NOT NULL,
    checksRain INTEGER NOT NULL,
    notes TEXT NOT NULL,
    UNIQUE (fileId, partOfFile)
  ) STRICT;

  CREATE TABLE blocks (
    blockId INTEGER PRIMARY KEY AUTOINCREMENT,
    passId INTEGER NOT NULL REFERENCES passes ON DELETE CASCADE,
    firstRow INTEGER NOT NULL,
    rows INTEGER NOT NULL,
    cells INTEGER NOT NULL,
    startMs INTEGER,
    endMs INTEGER,
    drawing BLOB NOT NULL,
    UNIQUE (passId, firstRow)
  ) STRICT;

  CREATE TABLE blockDetails (
    blockId INTEGER PRIMARY KEY REFERENCES blocks ON DELETE CASCADE,
    lon BLOB NOT NULL,
    lat BLOB NOT NULL,
    timeMs BLOB NOT NULL,
    rawFlags BLOB NOT NULL,
    chosenSolution BLOB NOT NULL
  ) STRICT;

  CREATE TABLE blockSolutions (
    blockId INTEGER PRIMARY KEY REFERENCES blocks ON DELETE CASCADE,
    slots INTEGER NOT NULL,
    speedMs BLOB NOT NULL,
    directionFrom BLOB NOT NULL,
    probability BLOB NOT NULL,
    fitDistance BLOB NOT NULL
  ) STRICT;

  CREATE TABLE blockBeams (
    blockId INTEGER PRIMARY KEY REFERENCES blocks ON DELETE CASCADE,
    count INTEGER NOT NULL,
    incidenceDeg BLOB NOT NULL,
    azimuthDeg BLOB NOT NULL,
    backscatterDb BLOB NOT NULL,
    noisePercent BLOB NOT NULL
  ) STRICT;

  CREATE TABLE blockBackgrounds (
    blockId INTEGER PRIMARY KEY REFERENCES blocks ON DELETE CASCADE,
    speedMs BLOB,
    directionFrom BLOB,
    iceProbability BLOB
  ) STRICT;

  -- Boxes of a block are entries 2 * blockId and 2 * blockId + 1; the second only where the block crosses the date line.
  CREATE VIRTUAL TABLE blockBoxes USING rtree (boxId, west, east, south, north);

  CREATE TRIGGER removeBlockBoxes AFTER DELETE ON blocks BEGIN
    DELETE FROM blockBoxes WHERE boxId IN (2 * old.blockId, 2 * old.blockId + 1);
  END;

  CREATE TABLE watchAreas (
    areaId INTEGER PRIMARY KEY AUTOINCREMENT,
    name TEXT NOT NULL,
    ring TEXT NOT NULL
  ) STRICT;

  CREATE TABLE settings (
    name TEXT PRIMARY KEY,
    value TEXT NOT NULL
  ) STRICT;
  `,
];
