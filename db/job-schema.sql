CREATE TABLE job (
  id            INTEGER PRIMARY KEY CHECK (id = 1),
  name          TEXT NOT NULL,
  site          TEXT NOT NULL,
  defaults_json TEXT NOT NULL CHECK (json_valid(defaults_json))
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
  drafts_json TEXT NOT NULL CHECK (json_valid(drafts_json))
) STRICT;

CREATE INDEX run_by_position ON run (position);
