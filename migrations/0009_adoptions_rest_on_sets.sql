ALTER TABLE "adoptions" DROP CONSTRAINT "adoptions_result_fkey";
--> statement-breakpoint
ALTER TABLE "adoptions" DROP COLUMN "result_id";