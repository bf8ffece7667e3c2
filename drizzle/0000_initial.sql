CREATE TABLE `assays` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`revision_id` bigint unsigned NOT NULL,
	`engine_version` varchar(40) NOT NULL,
	`content_hash` varchar(64) NOT NULL,
	`report` json NOT NULL,
	`duration_ms` double NOT NULL,
	`requested_by_id` bigint unsigned,
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `assays_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `figures` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`item_id` bigint unsigned NOT NULL,
	`sha256` varchar(64) NOT NULL,
	`media_type` enum('image/png','image/jpeg','image/svg+xml') NOT NULL,
	`content` mediumblob NOT NULL,
	`byte_length` int NOT NULL,
	`width` double NOT NULL,
	`height` double NOT NULL,
	`original_name` varchar(255) NOT NULL,
	`added_by_id` bigint unsigned NOT NULL,
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `figures_id` PRIMARY KEY(`id`),
	CONSTRAINT `figures_content` UNIQUE(`item_id`,`sha256`),
	CONSTRAINT `figures_size` CHECK(width > 0 and height > 0 and byte_length > 0)
);
--> statement-breakpoint
CREATE TABLE `items` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`code` varchar(16) NOT NULL,
	`topic_id` bigint unsigned NOT NULL,
	`owner_id` bigint unsigned NOT NULL,
	`state` enum('drafting','inReview','returned','approved','withdrawn') NOT NULL DEFAULT 'drafting',
	`title` varchar(160) NOT NULL,
	`marks` int NOT NULL DEFAULT 0,
	`parts_count` int NOT NULL DEFAULT 0,
	`search_text` longtext NOT NULL,
	`latest_revision_id` bigint unsigned,
	`approved_revision_id` bigint unsigned,
	`latest_assay_id` bigint unsigned,
	`worst_finding` enum('blocker','caution','note'),
	`origin` enum('written','imported','demo') NOT NULL DEFAULT 'written',
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	`updated_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `items_id` PRIMARY KEY(`id`),
	CONSTRAINT `items_code_unique` UNIQUE(`code`),
	CONSTRAINT `items_marks_range` CHECK(marks >= 0 and parts_count >= 0)
);
--> statement-breakpoint
CREATE TABLE `revision_authors` (
	`revision_id` bigint unsigned NOT NULL,
	`person_id` bigint unsigned NOT NULL,
	`first_edited_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `revision_authors_key` PRIMARY KEY(`revision_id`,`person_id`)
);
--> statement-breakpoint
CREATE TABLE `revisions` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`item_id` bigint unsigned NOT NULL,
	`number` int NOT NULL,
	`state` enum('drafting','inReview','returned','approved','withdrawn') NOT NULL DEFAULT 'drafting',
	`content` json NOT NULL,
	`content_hash` varchar(64) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	`author_id` bigint unsigned NOT NULL,
	`updated_by_id` bigint unsigned NOT NULL,
	`note` varchar(2000) NOT NULL DEFAULT '',
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	`updated_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `revisions_id` PRIMARY KEY(`id`),
	CONSTRAINT `revisions_number` UNIQUE(`item_id`,`number`),
	CONSTRAINT `revisions_number_positive` CHECK(number >= 1 and version >= 1)
);
--> statement-breakpoint
CREATE TABLE `paper_places` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`paper_id` bigint unsigned NOT NULL,
	`position` int NOT NULL,
	`item_id` bigint unsigned NOT NULL,
	`revision_id` bigint unsigned NOT NULL,
	`draw` bigint unsigned NOT NULL,
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `paper_places_id` PRIMARY KEY(`id`),
	CONSTRAINT `paper_places_position` UNIQUE(`paper_id`,`position`),
	CONSTRAINT `paper_places_item` UNIQUE(`paper_id`,`item_id`),
	CONSTRAINT `paper_places_position_positive` CHECK(position >= 1)
);
--> statement-breakpoint
CREATE TABLE `papers` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`code` varchar(16) NOT NULL,
	`title` varchar(160) NOT NULL,
	`subtitle` varchar(160) NOT NULL DEFAULT '',
	`target_marks` int NOT NULL,
	`duration_minutes` int NOT NULL,
	`instructions` text NOT NULL,
	`state` enum('assembling','proposed','sealed','released') NOT NULL DEFAULT 'assembling',
	`version` int NOT NULL DEFAULT 1,
	`created_by_id` bigint unsigned NOT NULL,
	`proposed_by_id` bigint unsigned,
	`proposed_at` datetime(3),
	`released_at` datetime(3),
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	`updated_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `papers_id` PRIMARY KEY(`id`),
	CONSTRAINT `papers_code_unique` UNIQUE(`code`),
	CONSTRAINT `papers_targets` CHECK(target_marks >= 1 and duration_minutes >= 1),
	CONSTRAINT `papers_proposer_known` CHECK(state = 'assembling' or proposed_by_id is not null)
);
--> statement-breakpoint
CREATE TABLE `seals` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`paper_id` bigint unsigned NOT NULL,
	`canonical` longtext NOT NULL,
	`sha256` varchar(64) NOT NULL,
	`proposed_by_id` bigint unsigned NOT NULL,
	`confirmed_by_id` bigint unsigned NOT NULL,
	`sealed_at` datetime(3) NOT NULL,
	CONSTRAINT `seals_id` PRIMARY KEY(`id`),
	CONSTRAINT `seals_paperId_unique` UNIQUE(`paper_id`),
	CONSTRAINT `seals_two_people` CHECK(proposed_by_id <> confirmed_by_id)
);
--> statement-breakpoint
CREATE TABLE `one_time_tokens` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`person_id` bigint unsigned NOT NULL,
	`purpose` enum('invitation','passwordReset') NOT NULL,
	`token_hash` varchar(64) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`used_at` datetime(3),
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `one_time_tokens_id` PRIMARY KEY(`id`),
	CONSTRAINT `one_time_tokens_tokenHash_unique` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `people` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`email` varchar(254) NOT NULL,
	`name` varchar(120) NOT NULL,
	`password_hash` varchar(255),
	`active` boolean NOT NULL DEFAULT true,
	`version` int NOT NULL DEFAULT 1,
	`last_seen_at` datetime(3),
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	`updated_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `people_id` PRIMARY KEY(`id`),
	CONSTRAINT `people_email_unique` UNIQUE(`email`),
	CONSTRAINT `people_email_lower` CHECK(binary email = binary lower(email))
);
--> statement-breakpoint
CREATE TABLE `person_roles` (
	`person_id` bigint unsigned NOT NULL,
	`role` enum('writer','reviewer','setter','moderator','administrator') NOT NULL,
	`granted_by_id` bigint unsigned,
	`granted_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `person_roles_key` PRIMARY KEY(`person_id`,`role`)
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`sid` varchar(64) NOT NULL,
	`data` json NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`person_id` bigint unsigned,
	CONSTRAINT `sessions_sid` PRIMARY KEY(`sid`)
);
--> statement-breakpoint
CREATE TABLE `sign_in_attempts` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`kind` enum('account','address') NOT NULL,
	`subject` varchar(64) NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `sign_in_attempts_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `audit_events` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`at` datetime(3) NOT NULL,
	`person_id` bigint unsigned,
	`session_ref` varchar(16),
	`event` varchar(60) NOT NULL,
	`subject_type` varchar(40) NOT NULL,
	`subject_id` bigint unsigned,
	`summary` varchar(500) NOT NULL,
	`before` json,
	`after` json,
	`previous_hash` varchar(64) NOT NULL,
	`hash` varchar(64) NOT NULL,
	CONSTRAINT `audit_events_id` PRIMARY KEY(`id`),
	CONSTRAINT `audit_events_hash_unique` UNIQUE(`hash`)
);
--> statement-breakpoint
CREATE TABLE `audit_head` (
	`id` tinyint NOT NULL,
	`hash` varchar(64) NOT NULL,
	CONSTRAINT `audit_head_id` PRIMARY KEY(`id`),
	CONSTRAINT `audit_head_single` CHECK(id = 1)
);
--> statement-breakpoint
CREATE TABLE `outgoing_mail` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`kind` varchar(40) NOT NULL,
	`person_id` bigint unsigned,
	`address` varchar(254) NOT NULL,
	`payload` json NOT NULL,
	`dedupe_key` varchar(120) NOT NULL,
	`state` enum('waiting','sent','failed') NOT NULL DEFAULT 'waiting',
	`attempts` int NOT NULL DEFAULT 0,
	`next_attempt_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	`sent_at` datetime(3),
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `outgoing_mail_id` PRIMARY KEY(`id`),
	CONSTRAINT `outgoing_mail_dedupeKey_unique` UNIQUE(`dedupe_key`),
	CONSTRAINT `outgoing_mail_sent` CHECK((state = 'sent') = (sent_at is not null))
);
--> statement-breakpoint
CREATE TABLE `comments` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`review_id` bigint unsigned NOT NULL,
	`revision_id` bigint unsigned NOT NULL,
	`anchor` varchar(40) NOT NULL DEFAULT '',
	`author_id` bigint unsigned NOT NULL,
	`text` varchar(4000) NOT NULL,
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `comments_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `independent_workings` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`review_id` bigint unsigned NOT NULL,
	`part_id` varchar(40) NOT NULL,
	`attempt` int NOT NULL,
	`text` varchar(200) NOT NULL,
	`agrees` boolean NOT NULL,
	`verdict` json NOT NULL,
	`remark` varchar(400) NOT NULL DEFAULT '',
	`disputed` boolean NOT NULL DEFAULT false,
	`settled_reason` varchar(2000),
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `independent_workings_id` PRIMARY KEY(`id`),
	CONSTRAINT `independent_workings_attempt` UNIQUE(`review_id`,`part_id`,`attempt`),
	CONSTRAINT `independent_workings_attempt_positive` CHECK(attempt >= 1)
);
--> statement-breakpoint
CREATE TABLE `reviews` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`item_id` bigint unsigned NOT NULL,
	`revision_id` bigint unsigned NOT NULL,
	`requested_by_id` bigint unsigned NOT NULL,
	`reviewer_id` bigint unsigned,
	`stage` enum('waiting','working','revealed','decided') NOT NULL DEFAULT 'waiting',
	`draw` bigint unsigned NOT NULL,
	`note` varchar(2000) NOT NULL DEFAULT '',
	`due_on` date,
	`decision` enum('approved','returned','recalled'),
	`decision_reason` varchar(4000) NOT NULL DEFAULT '',
	`accepted_cautions` json NOT NULL DEFAULT ('{}'),
	`claimed_at` datetime(3),
	`revealed_at` datetime(3),
	`decided_at` datetime(3),
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `reviews_id` PRIMARY KEY(`id`),
	CONSTRAINT `reviews_revisionId_unique` UNIQUE(`revision_id`),
	CONSTRAINT `reviews_decision` CHECK((stage = 'decided') = (decision is not null)),
	CONSTRAINT `reviews_reviewer_known` CHECK(stage in ('waiting', 'decided') or reviewer_id is not null)
);
--> statement-breakpoint
CREATE TABLE `counters` (
	`name` varchar(40) NOT NULL,
	`value` bigint unsigned NOT NULL,
	CONSTRAINT `counters_name` PRIMARY KEY(`name`)
);
--> statement-breakpoint
CREATE TABLE `topics` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`code` varchar(3) NOT NULL,
	`name` varchar(120) NOT NULL,
	`position` int NOT NULL DEFAULT 0,
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `topics_id` PRIMARY KEY(`id`),
	CONSTRAINT `topics_code_unique` UNIQUE(`code`),
	CONSTRAINT `topics_name_unique` UNIQUE(`name`),
	CONSTRAINT `topics_code_capitals` CHECK(code regexp binary '^[A-Z]{2,3}$')
);
--> statement-breakpoint
ALTER TABLE `assays` ADD CONSTRAINT `assays_revision_id_revisions_id_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `assays` ADD CONSTRAINT `assays_requested_by_id_people_id_fk` FOREIGN KEY (`requested_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `figures` ADD CONSTRAINT `figures_item_id_items_id_fk` FOREIGN KEY (`item_id`) REFERENCES `items`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `figures` ADD CONSTRAINT `figures_added_by_id_people_id_fk` FOREIGN KEY (`added_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `items` ADD CONSTRAINT `items_topic_id_topics_id_fk` FOREIGN KEY (`topic_id`) REFERENCES `topics`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `items` ADD CONSTRAINT `items_owner_id_people_id_fk` FOREIGN KEY (`owner_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `items` ADD CONSTRAINT `items_latest_revision_id_revisions_id_fk` FOREIGN KEY (`latest_revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `items` ADD CONSTRAINT `items_approved_revision_id_revisions_id_fk` FOREIGN KEY (`approved_revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `items` ADD CONSTRAINT `items_latest_assay_id_assays_id_fk` FOREIGN KEY (`latest_assay_id`) REFERENCES `assays`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revision_authors` ADD CONSTRAINT `revision_authors_revision_id_revisions_id_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revision_authors` ADD CONSTRAINT `revision_authors_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revisions` ADD CONSTRAINT `revisions_item_id_items_id_fk` FOREIGN KEY (`item_id`) REFERENCES `items`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revisions` ADD CONSTRAINT `revisions_author_id_people_id_fk` FOREIGN KEY (`author_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revisions` ADD CONSTRAINT `revisions_updated_by_id_people_id_fk` FOREIGN KEY (`updated_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `paper_places` ADD CONSTRAINT `paper_places_paper_id_papers_id_fk` FOREIGN KEY (`paper_id`) REFERENCES `papers`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `paper_places` ADD CONSTRAINT `paper_places_item_id_items_id_fk` FOREIGN KEY (`item_id`) REFERENCES `items`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `paper_places` ADD CONSTRAINT `paper_places_revision_id_revisions_id_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `papers` ADD CONSTRAINT `papers_created_by_id_people_id_fk` FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `papers` ADD CONSTRAINT `papers_proposed_by_id_people_id_fk` FOREIGN KEY (`proposed_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `seals` ADD CONSTRAINT `seals_paper_id_papers_id_fk` FOREIGN KEY (`paper_id`) REFERENCES `papers`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `seals` ADD CONSTRAINT `seals_proposed_by_id_people_id_fk` FOREIGN KEY (`proposed_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `seals` ADD CONSTRAINT `seals_confirmed_by_id_people_id_fk` FOREIGN KEY (`confirmed_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `one_time_tokens` ADD CONSTRAINT `one_time_tokens_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `person_roles` ADD CONSTRAINT `person_roles_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `person_roles` ADD CONSTRAINT `person_roles_granted_by_id_people_id_fk` FOREIGN KEY (`granted_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sessions` ADD CONSTRAINT `sessions_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `audit_events` ADD CONSTRAINT `audit_events_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `outgoing_mail` ADD CONSTRAINT `outgoing_mail_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `comments` ADD CONSTRAINT `comments_review_id_reviews_id_fk` FOREIGN KEY (`review_id`) REFERENCES `reviews`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `comments` ADD CONSTRAINT `comments_revision_id_revisions_id_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `comments` ADD CONSTRAINT `comments_author_id_people_id_fk` FOREIGN KEY (`author_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `independent_workings` ADD CONSTRAINT `independent_workings_review_id_reviews_id_fk` FOREIGN KEY (`review_id`) REFERENCES `reviews`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reviews` ADD CONSTRAINT `reviews_item_id_items_id_fk` FOREIGN KEY (`item_id`) REFERENCES `items`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reviews` ADD CONSTRAINT `reviews_revision_id_revisions_id_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reviews` ADD CONSTRAINT `reviews_requested_by_id_people_id_fk` FOREIGN KEY (`requested_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reviews` ADD CONSTRAINT `reviews_reviewer_id_people_id_fk` FOREIGN KEY (`reviewer_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `assays_revision` ON `assays` (`revision_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `items_updated` ON `items` (`updated_at`);--> statement-breakpoint
CREATE INDEX `items_title` ON `items` (`title`);--> statement-breakpoint
CREATE INDEX `items_marks` ON `items` (`marks`);--> statement-breakpoint
CREATE INDEX `items_state` ON `items` (`state`,`updated_at`);--> statement-breakpoint
CREATE INDEX `items_topic` ON `items` (`topic_id`,`state`,`updated_at`);--> statement-breakpoint
CREATE INDEX `items_owner` ON `items` (`owner_id`,`state`,`updated_at`);--> statement-breakpoint
CREATE INDEX `items_finding` ON `items` (`worst_finding`,`updated_at`);--> statement-breakpoint
CREATE INDEX `revision_authors_person` ON `revision_authors` (`person_id`);--> statement-breakpoint
CREATE INDEX `paper_places_used` ON `paper_places` (`item_id`);--> statement-breakpoint
CREATE INDEX `papers_state` ON `papers` (`state`,`updated_at`);--> statement-breakpoint
CREATE INDEX `papers_updated` ON `papers` (`updated_at`);--> statement-breakpoint
CREATE INDEX `one_time_tokens_expires` ON `one_time_tokens` (`expires_at`);--> statement-breakpoint
CREATE INDEX `people_name` ON `people` (`name`);--> statement-breakpoint
CREATE INDEX `person_roles_role` ON `person_roles` (`role`);--> statement-breakpoint
CREATE INDEX `sessions_expires` ON `sessions` (`expires_at`);--> statement-breakpoint
CREATE INDEX `sessions_person` ON `sessions` (`person_id`);--> statement-breakpoint
CREATE INDEX `sign_in_attempts_subject` ON `sign_in_attempts` (`kind`,`subject`,`at`);--> statement-breakpoint
CREATE INDEX `sign_in_attempts_at` ON `sign_in_attempts` (`at`);--> statement-breakpoint
CREATE INDEX `audit_events_at` ON `audit_events` (`at`);--> statement-breakpoint
CREATE INDEX `audit_events_person` ON `audit_events` (`person_id`,`at`);--> statement-breakpoint
CREATE INDEX `audit_events_event` ON `audit_events` (`event`,`at`);--> statement-breakpoint
CREATE INDEX `audit_events_subject` ON `audit_events` (`subject_type`,`subject_id`,`at`);--> statement-breakpoint
CREATE INDEX `outgoing_mail_due` ON `outgoing_mail` (`state`,`next_attempt_at`);--> statement-breakpoint
CREATE INDEX `comments_review` ON `comments` (`review_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `reviews_item` ON `reviews` (`item_id`);--> statement-breakpoint
CREATE INDEX `reviews_stage` ON `reviews` (`stage`,`created_at`);--> statement-breakpoint
CREATE INDEX `reviews_reviewer` ON `reviews` (`reviewer_id`,`stage`,`created_at`);--> statement-breakpoint
CREATE INDEX `reviews_requester` ON `reviews` (`requested_by_id`,`created_at`);