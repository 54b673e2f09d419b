ALTER TABLE "surfaces" DROP CONSTRAINT "surfaces_site_check";--> statement-breakpoint
ALTER TABLE "vocabulary_terms" DROP CONSTRAINT "vocabulary_terms_list_check";--> statement-breakpoint
ALTER TABLE "surfaces" ADD COLUMN "host" text collate "C";--> statement-breakpoint
ALTER TABLE "surfaces" ADD COLUMN "guest" text collate "C";--> statement-breakpoint
ALTER TABLE "surfaces" ADD COLUMN "arrangement" text collate "C";--> statement-breakpoint
ALTER TABLE "surfaces" ADD COLUMN "guest_monolayers" double precision;--> statement-breakpoint
ALTER TABLE "surfaces" ADD COLUMN "reconstruction" text;--> statement-breakpoint
ALTER TABLE "surfaces" ADD COLUMN "dispersion" double precision;--> statement-breakpoint
ALTER TABLE "surfaces" ADD COLUMN "strain_percent" double precision;--> statement-breakpoint
ALTER TABLE "surfaces" ADD COLUMN "step_fraction" double precision;--> statement-breakpoint
ALTER TABLE "surfaces" ADD CONSTRAINT "surfaces_arrangement_check" CHECK ("surfaces"."arrangement" in ('overlayer', 'subsurface', 'single-atom', 'surface-alloy', 'core-shell'));--> statement-breakpoint
ALTER TABLE "surfaces" ADD CONSTRAINT "surfaces_site_check" CHECK ("surfaces"."site" in ('terrace', 'step-edge', 'kink', 'defect', 'B5', 'fcc-hollow', 'hcp-hollow', 'bridge', 'top', 'threefold-hollow', 'fourfold-hollow', 'long-bridge', 'short-bridge', 'edge', 'corner', 'interface', 'subsurface'));--> statement-breakpoint
ALTER TABLE "vocabulary_terms" ADD CONSTRAINT "vocabulary_terms_list_check" CHECK ("vocabulary_terms"."list" in ('metal', 'facet', 'technique', 'support', 'step-class', 'species', 'alloy', 'site'));