ALTER TABLE `teams` ADD `catalogue_version` integer DEFAULT 0 NOT NULL;
--> statement-breakpoint
-- Every change of an entry or of one of its revisions counts (a rebuild of either table drops its triggers: make them anew).
CREATE TRIGGER `catalogue_version_cable_insert` AFTER INSERT ON `cables`
BEGIN
  UPDATE `teams` SET `catalogue_version` = `catalogue_version` + 1 WHERE `id` = NEW.`team_id`;
END;
--> statement-breakpoint
CREATE TRIGGER `catalogue_version_cable_update` AFTER UPDATE ON `cables`
BEGIN
  UPDATE `teams` SET `catalogue_version` = `catalogue_version` + 1 WHERE `id` IN (OLD.`team_id`, NEW.`team_id`);
END;
--> statement-breakpoint
CREATE TRIGGER `catalogue_version_cable_delete` AFTER DELETE ON `cables`
BEGIN
  UPDATE `teams` SET `catalogue_version` = `catalogue_version` + 1 WHERE `id` = OLD.`team_id`;
END;
--> statement-breakpoint
CREATE TRIGGER `catalogue_version_revision_insert` AFTER INSERT ON `cable_revisions`
BEGIN
  UPDATE `teams` SET `catalogue_version` = `catalogue_version` + 1
    WHERE `id` = (SELECT `team_id` FROM `cables` WHERE `id` = NEW.`cable_id`);
END;
--> statement-breakpoint
CREATE TRIGGER `catalogue_version_revision_update` AFTER UPDATE ON `cable_revisions`
BEGIN
  UPDATE `teams` SET `catalogue_version` = `catalogue_version` + 1
    WHERE `id` IN (SELECT `team_id` FROM `cables` WHERE `id` IN (OLD.`cable_id`, NEW.`cable_id`));
END;
--> statement-breakpoint
CREATE TRIGGER `catalogue_version_revision_delete` AFTER DELETE ON `cable_revisions`
BEGIN
  UPDATE `teams` SET `catalogue_version` = `catalogue_version` + 1
    WHERE `id` = (SELECT `team_id` FROM `cables` WHERE `id` = OLD.`cable_id`);
END;
