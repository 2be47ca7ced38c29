-- A revision that has been approved keeps its values for good. A migration that rebuilds cable_revisions drops this
-- trigger with the old table and must make it anew; a test notices when it does not.
CREATE TRIGGER `cable_revisions_approved_values_stay`
BEFORE UPDATE OF `cable_id`, `revision`, `name`, `family`, `model`, `construction`, `build`, `figures`, `limits`, `author_id` ON `cable_revisions`
WHEN OLD.`approved_at` IS NOT NULL
BEGIN
  SELECT RAISE(ABORT, 'the values of an approved revision never change');
END;
