-- Marks are listed as people count: F2 before F10. The index lets a page of a long schedule be read in that order.
CREATE COLLATION natural_order (provider = icu, locale = 'und-u-kn-true');
--> statement-breakpoint
CREATE INDEX footing_mark_order ON footing (project_id, mark COLLATE natural_order, id);
