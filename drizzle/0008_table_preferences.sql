ALTER TABLE "user_preferences" ADD COLUMN "hidden_columns" text[];--> statement-breakpoint
ALTER TABLE "user_preferences" ADD COLUMN "rows" text collate "C" DEFAULT 'comfortable' NOT NULL;