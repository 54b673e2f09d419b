CREATE TABLE "search_words" (
	"word" text collate "C" PRIMARY KEY NOT NULL
);
--> statement-breakpoint
ALTER TABLE "vocabulary_terms" DROP CONSTRAINT "vocabulary_terms_list_check";--> statement-breakpoint
DROP INDEX "search_rows_step_idx";--> statement-breakpoint
DROP INDEX "search_rows_metal_idx";--> statement-breakpoint
DROP INDEX "search_rows_source_idx";--> statement-breakpoint
DROP INDEX "search_rows_document_idx";--> statement-breakpoint
DROP INDEX "search_rows_text_idx";--> statement-breakpoint
DROP INDEX "search_rows_energy_idx";--> statement-breakpoint
DROP TRIGGER guard_search_row ON "search_rows";--> statement-breakpoint
ALTER TABLE "search_rows" ALTER COLUMN "accepted_at" DROP NOT NULL;--> statement-breakpoint
ALTER TABLE "search_rows" ADD COLUMN "state" text collate "C" NOT NULL DEFAULT '';--> statement-breakpoint
ALTER TABLE "search_rows" ADD COLUMN "made_by" integer NOT NULL DEFAULT 1;--> statement-breakpoint
ALTER TABLE "search_rows" ADD COLUMN "author_id" uuid NOT NULL DEFAULT '00000000-0000-0000-0000-000000000000';--> statement-breakpoint
ALTER TABLE "search_rows" ADD COLUMN "contributor_key" text collate "C" NOT NULL DEFAULT '';--> statement-breakpoint
ALTER TABLE "search_rows" ADD COLUMN "cleavage" text collate "C";--> statement-breakpoint
ALTER TABLE "search_rows" ADD COLUMN "species" text[] NOT NULL DEFAULT '{}';--> statement-breakpoint
ALTER TABLE "search_rows" ADD COLUMN "support" text collate "C";--> statement-breakpoint
ALTER TABLE "search_rows" ADD COLUMN "promoters" text[] NOT NULL DEFAULT '{}';--> statement-breakpoint
ALTER TABLE "search_rows" ADD COLUMN "author_keys" text[] NOT NULL DEFAULT '{}';--> statement-breakpoint
ALTER TABLE "search_rows" ADD COLUMN "has_uncertainty" boolean NOT NULL DEFAULT false;--> statement-breakpoint
ALTER TABLE "search_rows" ADD COLUMN "ln_factor" double precision;--> statement-breakpoint
ALTER TABLE "search_rows" ADD COLUMN "factor_unit" text collate "C";--> statement-breakpoint
-- Rows that are there already get what SQL can say of them; made_by is 1, so that the program makes them anew.
UPDATE "search_rows" s SET "state" = r."state", "author_id" = r."author_id" FROM "revisions" r WHERE r."id" = s."revision_id";--> statement-breakpoint
ALTER TABLE "search_rows" ALTER COLUMN "state" DROP DEFAULT;--> statement-breakpoint
ALTER TABLE "search_rows" ALTER COLUMN "made_by" DROP DEFAULT;--> statement-breakpoint
ALTER TABLE "search_rows" ALTER COLUMN "author_id" DROP DEFAULT;--> statement-breakpoint
ALTER TABLE "search_rows" ALTER COLUMN "contributor_key" DROP DEFAULT;--> statement-breakpoint
ALTER TABLE "search_rows" ALTER COLUMN "species" DROP DEFAULT;--> statement-breakpoint
ALTER TABLE "search_rows" ALTER COLUMN "promoters" DROP DEFAULT;--> statement-breakpoint
ALTER TABLE "search_rows" ALTER COLUMN "author_keys" DROP DEFAULT;--> statement-breakpoint
ALTER TABLE "search_rows" ALTER COLUMN "has_uncertainty" DROP DEFAULT;--> statement-breakpoint
ALTER TABLE "search_rows" DROP COLUMN "listed";--> statement-breakpoint
ALTER TABLE "search_rows" ADD COLUMN "listed" boolean GENERATED ALWAYS AS (state = 'accepted') STORED NOT NULL;--> statement-breakpoint
CREATE INDEX "search_rows_energy_idx" ON "search_rows" USING btree ("energy_kj_per_mol","accession") WHERE "search_rows"."listed";--> statement-breakpoint
CREATE INDEX "search_words_text_idx" ON "search_words" USING gin ("word" gin_trgm_ops);--> statement-breakpoint
CREATE INDEX "search_rows_energy_falling_idx" ON "search_rows" USING btree ("energy_kj_per_mol" DESC NULLS LAST,"accession") WHERE "search_rows"."listed";--> statement-breakpoint
CREATE INDEX "search_rows_accession_idx" ON "search_rows" USING btree ("accession") WHERE "search_rows"."listed";--> statement-breakpoint
CREATE INDEX "search_rows_unlisted_idx" ON "search_rows" USING btree ("state","author_id") WHERE not "search_rows"."listed";--> statement-breakpoint
CREATE INDEX "search_rows_species_idx" ON "search_rows" USING gin ("species") WHERE "search_rows"."listed";--> statement-breakpoint
CREATE INDEX "search_rows_elements_idx" ON "search_rows" USING gin ("elements") WHERE "search_rows"."listed";--> statement-breakpoint
CREATE INDEX "search_rows_author_idx" ON "search_rows" USING gin ("author_keys") WHERE "search_rows"."listed";--> statement-breakpoint
CREATE INDEX "search_rows_step_idx" ON "search_rows" USING btree ("step_key","step_direction" DESC NULLS LAST,"surface_label","accession") WHERE "search_rows"."listed";--> statement-breakpoint
CREATE INDEX "search_rows_metal_idx" ON "search_rows" USING btree ("metal","step_key","step_direction" DESC NULLS LAST,"surface_label","accession") WHERE "search_rows"."listed";--> statement-breakpoint
CREATE INDEX "search_rows_source_idx" ON "search_rows" USING btree ("source_id");--> statement-breakpoint
CREATE INDEX "search_rows_document_idx" ON "search_rows" USING gin ("document") WHERE "search_rows"."listed";--> statement-breakpoint
CREATE INDEX "search_rows_text_idx" ON "search_rows" USING gin ("search_text" gin_trgm_ops) WHERE "search_rows"."listed";--> statement-breakpoint
ALTER TABLE "search_rows" ADD CONSTRAINT "search_rows_state_check" CHECK ("search_rows"."state" in ('draft', 'submitted', 'under-review', 'returned', 'accepted', 'rejected', 'withdrawn', 'superseded', 'retracted'));--> statement-breakpoint
ALTER TABLE "vocabulary_terms" ADD CONSTRAINT "vocabulary_terms_list_check" CHECK ("vocabulary_terms"."list" in ('metal', 'facet', 'technique', 'support', 'step-class', 'species'));