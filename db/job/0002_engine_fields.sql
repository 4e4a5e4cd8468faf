-- The fields of the complete engine: further shapes, films, conditions, limits, fittings and the survey. The layout of
-- the tables is unchanged; an older program is told that the file is newer.
SELECT 1;
