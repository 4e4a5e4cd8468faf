-- The catalogue is rebuilt from the CSV files of db/seed whenever they changed; this row remembers which state of
-- those files the shipped rows came from. Every other table carries `origin`: shipped rows are replaced by a new
-- seed, rows of the user are never touched.
CREATE TABLE seed_state (
  id           INTEGER PRIMARY KEY CHECK (id = 1),
  content_hash TEXT NOT NULL
) STRICT;
