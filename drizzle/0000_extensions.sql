-- Text search by trigrams, and folding of accents; both are trusted extensions of Debian's PostgreSQL.
create extension if not exists pg_trgm;--> statement-breakpoint
create extension if not exists unaccent;
