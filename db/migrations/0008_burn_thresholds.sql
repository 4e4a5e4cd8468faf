-- Surface temperatures at which bare skin begins to burn, by surface and contact time: lower and upper end of the
-- spread. `surface` is a touch class, or the coat of a coated metal with its thickness in micrometres.
-- `grade` says how sure the lower end is: H two texts or more agree, M one text or a checked recollection, L derived.
CREATE TABLE burn_threshold (
  surface    TEXT NOT NULL CHECK (surface <> ''),
  contact_s  REAL NOT NULL CHECK (contact_s BETWEEN 0.5 AND 28800),
  lower_c    REAL NOT NULL CHECK (lower_c BETWEEN 43 AND 200),
  -- Null where the standard gives one value or the upper end is not known.
  upper_c    REAL CHECK (upper_c >= lower_c),
  grade      TEXT NOT NULL CHECK (grade IN ('H', 'M', 'L')),
  note       TEXT NOT NULL,
  source     TEXT NOT NULL CHECK (source <> ''),
  confidence TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin     TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  PRIMARY KEY (surface, contact_s)
) STRICT;
