-- The search of the bank; drizzle-kit has no words for a full-text index.
ALTER TABLE `items` ADD FULLTEXT INDEX `items_search` (`code`, `title`, `search_text`);
