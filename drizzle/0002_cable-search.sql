-- Full text of the catalogue, kept in step by triggers on cable_revisions (as above: a rebuild of that table drops them).
-- `team` is the team's id without its hyphens, one token, so that a search never leaves the team.
CREATE VIRTUAL TABLE `cable_search` USING fts5(`team`, `words`, `cable_id` UNINDEXED, `revision` UNINDEXED);
--> statement-breakpoint
CREATE TRIGGER `cable_search_insert` AFTER INSERT ON `cable_revisions`
BEGIN
  INSERT INTO `cable_search` (`team`, `words`, `cable_id`, `revision`)
    SELECT replace(`team_id`, '-', ''), NEW.`words`, NEW.`cable_id`, NEW.`revision` FROM `cables` WHERE `id` = NEW.`cable_id`;
  UPDATE `teams` SET `words_version` = `words_version` + 1 WHERE `id` = (SELECT `team_id` FROM `cables` WHERE `id` = NEW.`cable_id`);
END;
--> statement-breakpoint
CREATE TRIGGER `cable_search_update` AFTER UPDATE OF `words` ON `cable_revisions`
BEGIN
  UPDATE `cable_search` SET `words` = NEW.`words` WHERE `cable_id` = NEW.`cable_id` AND `revision` = NEW.`revision`;
  UPDATE `teams` SET `words_version` = `words_version` + 1 WHERE `id` = (SELECT `team_id` FROM `cables` WHERE `id` = NEW.`cable_id`);
END;
--> statement-breakpoint
CREATE TRIGGER `cable_search_delete` AFTER DELETE ON `cable_revisions`
BEGIN
  DELETE FROM `cable_search` WHERE `cable_id` = OLD.`cable_id` AND `revision` = OLD.`revision`;
  UPDATE `teams` SET `words_version` = `words_version` + 1 WHERE `id` = (SELECT `team_id` FROM `cables` WHERE `id` = OLD.`cable_id`);
END;
