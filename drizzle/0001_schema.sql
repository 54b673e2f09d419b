CREATE TABLE "rate_counters" (
	"key" text collate "C" PRIMARY KEY NOT NULL,
	"hits" double precision NOT NULL,
	"window_ends_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"sid" text collate "C" PRIMARY KEY NOT NULL,
	"sess" jsonb NOT NULL,
	"expire" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "user_preferences" (
	"user_id" uuid PRIMARY KEY NOT NULL,
	"energy_unit" text collate "C" NOT NULL,
	"temperature_k" double precision NOT NULL,
	"theme" text collate "C" NOT NULL
);
--> statement-breakpoint
CREATE TABLE "user_roles" (
	"user_id" uuid NOT NULL,
	"role" text collate "C" NOT NULL,
	"granted_by" uuid,
	"reason" text,
	"granted_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "user_roles_user_id_role_pk" PRIMARY KEY("user_id","role"),
	CONSTRAINT "user_roles_role_check" CHECK ("user_roles"."role" in ('reader', 'contributor', 'reviewer', 'curator'))
);
--> statement-breakpoint
CREATE TABLE "users" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"email" text collate "C" NOT NULL,
	"name" text NOT NULL,
	"password_hash" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"disabled_at" timestamp with time zone,
	CONSTRAINT "users_email_key" UNIQUE("email")
);
--> statement-breakpoint
CREATE TABLE "accepted_conversions" (
	"revision_id" uuid PRIMARY KEY NOT NULL,
	"conversion_id" uuid NOT NULL
);
--> statement-breakpoint
CREATE TABLE "conversions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"revision_id" uuid NOT NULL,
	"core_version" text collate "C" NOT NULL,
	"constants_version" text collate "C" NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "converted_quantities" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"conversion_id" uuid NOT NULL,
	"quantity_id" uuid NOT NULL,
	"value" double precision,
	"low" double precision,
	"high" double precision,
	"standard_uncertainty" double precision,
	"unit" text collate "C" NOT NULL,
	"site_value" double precision,
	"site_unit" text collate "C",
	"site_exponent_change" double precision,
	"missing" jsonb NOT NULL,
	"derivation" jsonb NOT NULL,
	CONSTRAINT "converted_quantities_key" UNIQUE("conversion_id","quantity_id")
);
--> statement-breakpoint
CREATE TABLE "entries" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"accession" text collate "C" NOT NULL,
	"contributor_id" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "entries_accession_key" UNIQUE("accession")
);
--> statement-breakpoint
CREATE TABLE "quantities" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"revision_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"symbol" text collate "C" NOT NULL,
	"energy_type" text collate "C",
	"as_printed" text NOT NULL,
	"unit_as_printed" text NOT NULL,
	"unit_id" text collate "C",
	"multiplier" double precision,
	"bound" text collate "C" NOT NULL,
	"value" double precision,
	"low" double precision,
	"high" double precision,
	"reported_uncertainty" double precision,
	"reported_minus" double precision,
	"reported_plus" double precision,
	"uncertainty_kind" text collate "C" NOT NULL,
	"uncertainty_scale" text collate "C" NOT NULL,
	"standard_uncertainty" double precision,
	"significant_digits" integer,
	CONSTRAINT "quantities_revision_position_key" UNIQUE("revision_id","position"),
	CONSTRAINT "quantities_symbol_check" CHECK ("quantities"."symbol" in ('energy', 'preExponential', 'exponent', 'referenceTemperature', 'rateConstant', 'kie', 'stickingCoefficient', 'activationEntropy', 'reactionEnergy', 'adsorptionEnergy', 'equilibriumConstant', 'turnoverRate', 'reactionOrder', 'diffusionCoefficient', 'coverageSlope')),
	CONSTRAINT "quantities_energy_type_check" CHECK ("quantities"."energy_type" in ('arrhenius', 'electronic', 'zero-point-corrected', 'enthalpy', 'gibbs')),
	CONSTRAINT "quantities_bound_check" CHECK ("quantities"."bound" in ('=', '≈', '<', '≤', '>', '≥', 'range')),
	CONSTRAINT "quantities_uncertainty_kind_check" CHECK ("quantities"."uncertainty_kind" in ('none', 'unknown', 'standard', 'expanded', 'confidence', 'rectangular', 'triangular', 'fit-standard-error', 'spread')),
	CONSTRAINT "quantities_uncertainty_scale_check" CHECK ("quantities"."uncertainty_scale" in ('linear', 'ln')),
	CONSTRAINT "quantities_range_check" CHECK ("quantities"."low" is null or "quantities"."high" is null or "quantities"."low" <= "quantities"."high"),
	CONSTRAINT "quantities_uncertainty_sign_check" CHECK ("quantities"."standard_uncertainty" is null or "quantities"."standard_uncertainty" >= 0)
);
--> statement-breakpoint
CREATE TABLE "raised_checks" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"conversion_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"code" text collate "C" NOT NULL,
	"severity" text collate "C" NOT NULL,
	"message" text NOT NULL,
	CONSTRAINT "raised_checks_key" UNIQUE("conversion_id","position"),
	CONSTRAINT "raised_checks_severity_check" CHECK ("raised_checks"."severity" in ('blocking', 'warning', 'note'))
);
--> statement-breakpoint
CREATE TABLE "revisions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"entry_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"version" integer,
	"state" text collate "C" DEFAULT 'draft' NOT NULL,
	"lock" integer DEFAULT 1 NOT NULL,
	"author_id" uuid NOT NULL,
	"author_name" text NOT NULL,
	"input" jsonb NOT NULL,
	"input_hash" text collate "C" NOT NULL,
	"kind" text collate "C",
	"scope" text collate "C",
	"provenance" text collate "C",
	"step_id" uuid,
	"surface_id" uuid,
	"source_id" uuid,
	"method_class" text collate "C",
	"technique" text collate "C",
	"valid_min_k" double precision,
	"valid_max_k" double precision,
	"revise_reason" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"changed_at" timestamp with time zone DEFAULT now() NOT NULL,
	"accepted_at" timestamp with time zone,
	"ended_at" timestamp with time zone,
	"notice" text,
	CONSTRAINT "revisions_entry_number_key" UNIQUE("entry_id","number"),
	CONSTRAINT "revisions_entry_version_key" UNIQUE("entry_id","version"),
	CONSTRAINT "revisions_state_check" CHECK ("revisions"."state" in ('draft', 'submitted', 'under-review', 'returned', 'accepted', 'rejected', 'withdrawn', 'superseded', 'retracted')),
	CONSTRAINT "revisions_kind_check" CHECK ("revisions"."kind" in ('activation-energy', 'barrier', 'rate-constant', 'pre-exponential', 'kie', 'sticking', 'reaction-energy', 'adsorption-energy', 'equilibrium-constant', 'turnover-rate', 'reaction-order', 'diffusion')),
	CONSTRAINT "revisions_scope_check" CHECK ("revisions"."scope" in ('elementary', 'lumped', 'apparent')),
	CONSTRAINT "revisions_provenance_check" CHECK ("revisions"."provenance" in ('measured', 'derived-from-measured', 'fitted-in-kinetic-model', 'computed', 'computed-then-adjusted', 'estimated', 'assumed', 'quoted')),
	CONSTRAINT "revisions_method_class_check" CHECK ("revisions"."method_class" in ('measured', 'computed')),
	CONSTRAINT "revisions_valid_range_check" CHECK ("revisions"."valid_min_k" is null or "revisions"."valid_max_k" is null or "revisions"."valid_min_k" <= "revisions"."valid_max_k"),
	CONSTRAINT "revisions_version_check" CHECK (("revisions"."version" is not null) = ("revisions"."state" in ('accepted', 'superseded', 'retracted'))),
	CONSTRAINT "revisions_complete_check" CHECK ("revisions"."state" in ('draft', 'withdrawn') or ("revisions"."kind" is not null and "revisions"."scope" is not null and "revisions"."provenance" is not null and "revisions"."step_id" is not null and "revisions"."surface_id" is not null and "revisions"."source_id" is not null and "revisions"."method_class" is not null))
);
--> statement-breakpoint
CREATE TABLE "events" (
	"seq" bigint PRIMARY KEY NOT NULL,
	"at" timestamp with time zone NOT NULL,
	"recorded_at" timestamp with time zone DEFAULT now() NOT NULL,
	"actor_id" uuid,
	"action" text collate "C" NOT NULL,
	"subject_type" text collate "C" NOT NULL,
	"subject_id" uuid NOT NULL,
	"payload" jsonb NOT NULL,
	"previous_hash" "bytea" NOT NULL,
	"hash" "bytea" NOT NULL,
	CONSTRAINT "events_hash_key" UNIQUE("hash")
);
--> statement-breakpoint
CREATE TABLE "milestones" (
	"name" text collate "C" PRIMARY KEY NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "outbox" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"event_seq" bigint NOT NULL,
	"recipient_id" uuid NOT NULL,
	"template" text collate "C" NOT NULL,
	"parameters" jsonb NOT NULL,
	"message_id" text NOT NULL,
	"state" text collate "C" DEFAULT 'pending' NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"next_attempt_at" timestamp with time zone DEFAULT now() NOT NULL,
	"last_error" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "outbox_message_id_key" UNIQUE("message_id"),
	CONSTRAINT "outbox_state_check" CHECK ("outbox"."state" in ('pending', 'sending', 'sent', 'failed', 'uncertain'))
);
--> statement-breakpoint
CREATE TABLE "decisions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"submission_id" uuid NOT NULL,
	"decision" text collate "C" NOT NULL,
	"reason" text collate "C",
	"comment" text NOT NULL,
	"checklist" jsonb NOT NULL,
	"decided_by" uuid NOT NULL,
	"decided_at" timestamp with time zone NOT NULL,
	CONSTRAINT "decisions_submission_key" UNIQUE("submission_id"),
	CONSTRAINT "decisions_decision_check" CHECK ("decisions"."decision" in ('accept', 'return', 'reject')),
	CONSTRAINT "decisions_reason_check" CHECK ("decisions"."reason" in ('value-differs-from-source', 'unit-differs-from-source', 'step-or-direction', 'surface-or-site', 'uncertainty-kind', 'conditions-missing', 'locator-missing', 'quoted-from-elsewhere', 'duplicate', 'source-retracted', 'out-of-scope', 'other')),
	CONSTRAINT "decisions_reason_needed_check" CHECK ("decisions"."decision" = 'accept' or "decisions"."reason" is not null)
);
--> statement-breakpoint
CREATE TABLE "review_comments" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"submission_id" uuid NOT NULL,
	"author_id" uuid NOT NULL,
	"body" text NOT NULL,
	"created_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "submissions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"entry_id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"round" integer NOT NULL,
	"previous_id" uuid,
	"submitted_by" uuid NOT NULL,
	"submitted_at" timestamp with time zone NOT NULL,
	"claimed_by" uuid,
	"claim_expires_at" timestamp with time zone,
	"checklist" jsonb DEFAULT '{}'::jsonb NOT NULL,
	CONSTRAINT "submissions_entry_round_key" UNIQUE("entry_id","round"),
	CONSTRAINT "submissions_revision_round_key" UNIQUE("revision_id","round"),
	CONSTRAINT "submissions_claim_check" CHECK (("submissions"."claimed_by" is null) = ("submissions"."claim_expires_at" is null))
);
--> statement-breakpoint
CREATE TABLE "search_rows" (
	"revision_id" uuid PRIMARY KEY NOT NULL,
	"listed" boolean DEFAULT true NOT NULL,
	"accession" text collate "C" NOT NULL,
	"kind" text collate "C" NOT NULL,
	"kinds_held" text[] NOT NULL,
	"scope" text collate "C" NOT NULL,
	"provenance" text collate "C" NOT NULL,
	"energy_type" text collate "C",
	"step_key" text collate "C" NOT NULL,
	"step_direction" integer NOT NULL,
	"equation" text collate "C" NOT NULL,
	"step_class" text collate "C" NOT NULL,
	"bond" text collate "C",
	"metal" text collate "C",
	"formula" text collate "C" NOT NULL,
	"elements" text[] NOT NULL,
	"facet" text collate "C",
	"site" text collate "C",
	"sample_type" text collate "C",
	"surface_label" text collate "C" NOT NULL,
	"method_class" text collate "C" NOT NULL,
	"technique" text collate "C",
	"source_id" uuid NOT NULL,
	"source_label" text collate "C" NOT NULL,
	"doi" text collate "C",
	"year" integer,
	"valid_min_k" double precision,
	"valid_max_k" double precision,
	"energy_kj_per_mol" double precision,
	"energy_bound" text collate "C",
	"u_energy_kj_per_mol" double precision,
	"ln_pre_exponential" double precision,
	"exponent" double precision,
	"reference_temperature_k" double precision,
	"rate_unit" text collate "C",
	"values" jsonb NOT NULL,
	"search_text" text NOT NULL,
	"document" "tsvector" NOT NULL,
	"accepted_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sources" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"doi" text collate "C",
	"citation_key" text collate "C" NOT NULL,
	"csl" jsonb NOT NULL,
	"title" text NOT NULL,
	"authors" text NOT NULL,
	"label" text NOT NULL,
	"year" integer,
	"container" text,
	"citation" text NOT NULL,
	"bibtex" text NOT NULL,
	"ris" text NOT NULL,
	"status" text collate "C" DEFAULT 'current' NOT NULL,
	"notice" text,
	"origin" text collate "C" NOT NULL,
	"confirmed_at" timestamp with time zone,
	"looked_up_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sources_doi_key" UNIQUE("doi"),
	CONSTRAINT "sources_citation_key_key" UNIQUE("citation_key"),
	CONSTRAINT "sources_status_check" CHECK ("sources"."status" in ('current', 'corrected', 'retracted')),
	CONSTRAINT "sources_origin_check" CHECK ("sources"."origin" in ('doi', 'bibtex', 'ris', 'typed'))
);
--> statement-breakpoint
CREATE TABLE "elementary_steps" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"key" text collate "C" NOT NULL,
	"variant_key" text collate "C" NOT NULL,
	"direction" integer NOT NULL,
	"equation" text NOT NULL,
	"step_class" text collate "C" NOT NULL,
	"bond" text collate "C",
	"gas_order" double precision NOT NULL,
	"surface_order" double precision NOT NULL,
	"parser_version" text collate "C" NOT NULL,
	"merged_into" uuid,
	CONSTRAINT "elementary_steps_variant_key" UNIQUE("variant_key","direction","equation","parser_version"),
	CONSTRAINT "elementary_steps_direction_check" CHECK ("elementary_steps"."direction" in (-1, 1))
);
--> statement-breakpoint
CREATE TABLE "surfaces" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"key" text collate "C" NOT NULL,
	"metal" text collate "C",
	"formula" text collate "C" NOT NULL,
	"elements" jsonb NOT NULL,
	"structure" text collate "C",
	"facet" text collate "C",
	"site" text collate "C",
	"sample_type" text collate "C",
	"support" text,
	"particle_size_nm" double precision,
	"label" text NOT NULL,
	"merged_into" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "surfaces_key_key" UNIQUE("key"),
	CONSTRAINT "surfaces_structure_check" CHECK ("surfaces"."structure" in ('fcc', 'bcc', 'hcp', 'other')),
	CONSTRAINT "surfaces_site_check" CHECK ("surfaces"."site" in ('terrace', 'step-edge', 'kink', 'defect', 'B5', 'fcc-hollow', 'hcp-hollow', 'bridge', 'top')),
	CONSTRAINT "surfaces_sample_type_check" CHECK ("surfaces"."sample_type" in ('single-crystal', 'foil', 'film', 'supported-particles', 'powder', 'slab-model', 'cluster-model'))
);
--> statement-breakpoint
CREATE TABLE "vocabulary_terms" (
	"list" text collate "C" NOT NULL,
	"code" text collate "C" NOT NULL,
	"label" text NOT NULL,
	"synonyms" jsonb NOT NULL,
	"data" jsonb NOT NULL,
	"position" integer NOT NULL,
	CONSTRAINT "vocabulary_terms_list_code_pk" PRIMARY KEY("list","code"),
	CONSTRAINT "vocabulary_terms_list_check" CHECK ("vocabulary_terms"."list" in ('metal', 'facet', 'technique', 'support', 'step-class'))
);
--> statement-breakpoint
ALTER TABLE "user_preferences" ADD CONSTRAINT "user_preferences_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "user_roles" ADD CONSTRAINT "user_roles_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "user_roles" ADD CONSTRAINT "user_roles_granted_by_users_id_fk" FOREIGN KEY ("granted_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accepted_conversions" ADD CONSTRAINT "accepted_conversions_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accepted_conversions" ADD CONSTRAINT "accepted_conversions_conversion_id_conversions_id_fk" FOREIGN KEY ("conversion_id") REFERENCES "public"."conversions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "conversions" ADD CONSTRAINT "conversions_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "converted_quantities" ADD CONSTRAINT "converted_quantities_conversion_id_conversions_id_fk" FOREIGN KEY ("conversion_id") REFERENCES "public"."conversions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "converted_quantities" ADD CONSTRAINT "converted_quantities_quantity_id_quantities_id_fk" FOREIGN KEY ("quantity_id") REFERENCES "public"."quantities"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "entries" ADD CONSTRAINT "entries_contributor_id_users_id_fk" FOREIGN KEY ("contributor_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "quantities" ADD CONSTRAINT "quantities_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "raised_checks" ADD CONSTRAINT "raised_checks_conversion_id_conversions_id_fk" FOREIGN KEY ("conversion_id") REFERENCES "public"."conversions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_entry_id_entries_id_fk" FOREIGN KEY ("entry_id") REFERENCES "public"."entries"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_author_id_users_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_step_id_elementary_steps_id_fk" FOREIGN KEY ("step_id") REFERENCES "public"."elementary_steps"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_surface_id_surfaces_id_fk" FOREIGN KEY ("surface_id") REFERENCES "public"."surfaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_source_id_sources_id_fk" FOREIGN KEY ("source_id") REFERENCES "public"."sources"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "outbox" ADD CONSTRAINT "outbox_event_seq_events_seq_fk" FOREIGN KEY ("event_seq") REFERENCES "public"."events"("seq") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "outbox" ADD CONSTRAINT "outbox_recipient_id_users_id_fk" FOREIGN KEY ("recipient_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "decisions" ADD CONSTRAINT "decisions_submission_id_submissions_id_fk" FOREIGN KEY ("submission_id") REFERENCES "public"."submissions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "decisions" ADD CONSTRAINT "decisions_decided_by_users_id_fk" FOREIGN KEY ("decided_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "review_comments" ADD CONSTRAINT "review_comments_submission_id_submissions_id_fk" FOREIGN KEY ("submission_id") REFERENCES "public"."submissions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "review_comments" ADD CONSTRAINT "review_comments_author_id_users_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submissions" ADD CONSTRAINT "submissions_entry_id_entries_id_fk" FOREIGN KEY ("entry_id") REFERENCES "public"."entries"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submissions" ADD CONSTRAINT "submissions_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submissions" ADD CONSTRAINT "submissions_previous_id_submissions_id_fk" FOREIGN KEY ("previous_id") REFERENCES "public"."submissions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submissions" ADD CONSTRAINT "submissions_submitted_by_users_id_fk" FOREIGN KEY ("submitted_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submissions" ADD CONSTRAINT "submissions_claimed_by_users_id_fk" FOREIGN KEY ("claimed_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "search_rows" ADD CONSTRAINT "search_rows_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "elementary_steps" ADD CONSTRAINT "elementary_steps_merged_into_elementary_steps_id_fk" FOREIGN KEY ("merged_into") REFERENCES "public"."elementary_steps"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "surfaces" ADD CONSTRAINT "surfaces_merged_into_surfaces_id_fk" FOREIGN KEY ("merged_into") REFERENCES "public"."surfaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "sessions_expire_idx" ON "sessions" USING btree ("expire");--> statement-breakpoint
CREATE INDEX "conversions_revision_idx" ON "conversions" USING btree ("revision_id","created_at");--> statement-breakpoint
CREATE UNIQUE INDEX "revisions_one_open_per_entry" ON "revisions" USING btree ("entry_id") WHERE "revisions"."state" in ('draft', 'submitted', 'under-review');--> statement-breakpoint
CREATE UNIQUE INDEX "revisions_one_accepted_per_entry" ON "revisions" USING btree ("entry_id") WHERE "revisions"."state" = 'accepted';--> statement-breakpoint
CREATE INDEX "revisions_author_idx" ON "revisions" USING btree ("author_id","changed_at");--> statement-breakpoint
CREATE INDEX "revisions_source_idx" ON "revisions" USING btree ("source_id");--> statement-breakpoint
CREATE INDEX "events_subject_idx" ON "events" USING btree ("subject_type","subject_id","seq");--> statement-breakpoint
CREATE INDEX "outbox_state_idx" ON "outbox" USING btree ("state","next_attempt_at");--> statement-breakpoint
CREATE INDEX "review_comments_submission_idx" ON "review_comments" USING btree ("submission_id","created_at");--> statement-breakpoint
CREATE INDEX "submissions_submitted_at_idx" ON "submissions" USING btree ("submitted_at");--> statement-breakpoint
CREATE INDEX "search_rows_step_idx" ON "search_rows" USING btree ("step_key","metal") WHERE "search_rows"."listed";--> statement-breakpoint
CREATE INDEX "search_rows_metal_idx" ON "search_rows" USING btree ("metal") WHERE "search_rows"."listed";--> statement-breakpoint
CREATE INDEX "search_rows_energy_idx" ON "search_rows" USING btree ("energy_kj_per_mol","accession") WHERE "search_rows"."listed";--> statement-breakpoint
CREATE INDEX "search_rows_source_idx" ON "search_rows" USING btree ("source_id") WHERE "search_rows"."listed";--> statement-breakpoint
CREATE INDEX "search_rows_document_idx" ON "search_rows" USING gin ("document");--> statement-breakpoint
CREATE INDEX "search_rows_text_idx" ON "search_rows" USING gin ("search_text" gin_trgm_ops);--> statement-breakpoint
CREATE INDEX "elementary_steps_key_idx" ON "elementary_steps" USING btree ("key");