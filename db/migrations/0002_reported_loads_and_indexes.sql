ALTER TABLE "loads" DROP CONSTRAINT "loads_flags";--> statement-breakpoint
CREATE INDEX "decisions_by_load" ON "decisions" USING btree ("darkroom_id","load_action_id");--> statement-breakpoint
CREATE INDEX "order_lines_by_supplier_pack" ON "order_lines" USING btree ("darkroom_id","supplier_pack_id");--> statement-breakpoint
CREATE INDEX "supplier_packs_by_pack" ON "supplier_packs" USING btree ("darkroom_id","pack_id");--> statement-breakpoint
CREATE INDEX "mails_by_order" ON "mails" USING btree ("darkroom_id","order_id");--> statement-breakpoint
ALTER TABLE "loads" ADD CONSTRAINT "loads_flags" CHECK (flags <@ array['time_unsure', 'late', 'reported']::text[]);