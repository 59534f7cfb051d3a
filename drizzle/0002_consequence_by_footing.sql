CREATE INDEX "consequence_footing" ON "consequence" USING btree ("project_id","footing_id");--> statement-breakpoint
-- A change carries the counts of its consequences and neither can be altered afterwards: the consequences are streamed
-- in first, the change after them, and the key between the two is looked at when the transaction commits.
ALTER TABLE "consequence" ALTER CONSTRAINT "consequence_project_id_change_id_change_project_id_id_fk" DEFERRABLE INITIALLY DEFERRED;
