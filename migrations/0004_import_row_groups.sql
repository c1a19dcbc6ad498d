ALTER TABLE "import_rows" DROP CONSTRAINT "import_rows_result_fkey";
--> statement-breakpoint
ALTER TABLE "import_rows" ADD COLUMN "group_key" text;--> statement-breakpoint
CREATE INDEX "import_rows_group_idx" ON "import_rows" USING btree ("organisation_id","import_id","group_key","row_number");--> statement-breakpoint
ALTER TABLE "import_rows" DROP COLUMN "result_id";