-- What `vapour_tightness` says in words, as a choice. Null where the words say nothing: bare pipes, and rows that users
-- added before there was a choice.
ALTER TABLE finish ADD COLUMN vapour_tight TEXT CHECK (vapour_tight IN ('yes', 'if sealed', 'no'));
