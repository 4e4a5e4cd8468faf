CREATE TABLE job (
  id            INTEGER PRIMARY KEY CHECK (id = 1),
  name          TEXT NOT NULL,
  site          TEXT NOT NULL,
  defaults_json TEXT NOT NULL CHECK (json_valid(defaults_json)),
  -- CRC-32 of the texts: SQLite does not notice a bit that turned over inside a value, and a wrong temperature would
  -- be quoted.
  checksum      INTEGER NOT NULL
) STRICT;

CREATE TABLE meta (
  id         INTEGER PRIMARY KEY CHECK (id = 1),
  -- Counts the committed edits.
  revision   INTEGER NOT NULL CHECK (revision >= 0),
  created_at TEXT NOT NULL,  -- ISO 8601, UTC
  saved_at   TEXT NOT NULL   -- ISO 8601, UTC
) STRICT;

CREATE TABLE run (
  id          TEXT PRIMARY KEY CHECK (length(id) BETWEEN 1 AND 64),
  -- Order in the schedule, counted from 0; not unique, since rows move one by one inside a commit.
  position    INTEGER NOT NULL CHECK (position >= 0),
  values_json TEXT NOT NULL CHECK (json_valid(values_json)),
  drafts_json TEXT NOT NULL CHECK (json_valid(drafts_json)),
  -- CRC-32 of the texts plus the position, so that a run can move without being read.
  checksum    INTEGER NOT NULL
) STRICT;

CREATE INDEX run_by_position ON run (position);
