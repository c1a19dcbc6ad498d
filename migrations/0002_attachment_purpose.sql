ALTER TABLE "variants" ALTER COLUMN "length_mm" DROP NOT NULL;--> statement-breakpoint
ALTER TABLE "variants" ALTER COLUMN "width_mm" DROP NOT NULL;--> statement-breakpoint
ALTER TABLE "variants" ALTER COLUMN "height_mm" DROP NOT NULL;--> statement-breakpoint
ALTER TABLE "variants" ALTER COLUMN "wheelbase_mm" DROP NOT NULL;--> statement-breakpoint
ALTER TABLE "attachments" ADD COLUMN "purpose" text NOT NULL;--> statement-breakpoint
ALTER TABLE "attachments" ADD CONSTRAINT "attachments_purpose_check" CHECK ("attachments"."purpose" in ('picture', 'evidence'));