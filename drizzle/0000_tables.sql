CREATE TABLE "change" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"seq" bigint GENERATED ALWAYS AS IDENTITY (sequence name "change_seq_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"kind" text NOT NULL,
	"subject_id" uuid NOT NULL,
	"title" text NOT NULL,
	"reason" text NOT NULL,
	"value_id" uuid,
	"from_revision_id" uuid,
	"to_revision_id" uuid,
	"counts" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"made_by" uuid NOT NULL,
	"made_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "change_project_id_id_pk" PRIMARY KEY("project_id","id")
);
--> statement-breakpoint
CREATE TABLE "change_closure" (
	"project_id" uuid NOT NULL,
	"change_id" uuid NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"closed_by" uuid NOT NULL,
	"closed_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "change_closure_project_id_change_id_pk" PRIMARY KEY("project_id","change_id")
);
--> statement-breakpoint
CREATE TABLE "consequence" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"change_id" uuid NOT NULL,
	"footing_id" uuid NOT NULL,
	"check_id" uuid,
	"outcome" text NOT NULL,
	"verdict_before" text,
	"verdict_after" text NOT NULL,
	"utilisation_before" double precision,
	"utilisation_after" double precision,
	"required_net_kpa" double precision,
	"stage" text NOT NULL,
	CONSTRAINT "consequence_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "consequence_once" UNIQUE("project_id","change_id","footing_id")
);
--> statement-breakpoint
CREATE TABLE "disposition" (
	"project_id" uuid NOT NULL,
	"consequence_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"kind" text NOT NULL,
	"reason" text DEFAULT '' NOT NULL,
	"check_id" uuid,
	"answered_by" uuid NOT NULL,
	"answered_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "disposition_project_id_consequence_id_number_pk" PRIMARY KEY("project_id","consequence_id","number")
);
--> statement-breakpoint
CREATE TABLE "footing_check" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"seq" bigint GENERATED ALWAYS AS IDENTITY (sequence name "footing_check_seq_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"footing_id" uuid NOT NULL,
	"footing_revision_id" uuid NOT NULL,
	"load_set_id" uuid NOT NULL,
	"value_id" uuid NOT NULL,
	"value_revision_id" uuid NOT NULL,
	"value_kind" text NOT NULL,
	"net_allowable_kpa" double precision,
	"criteria_number" integer NOT NULL,
	"zone_revision_id" uuid NOT NULL,
	"hole_revision_ids" uuid[] DEFAULT '{}' NOT NULL,
	"engine_version" text NOT NULL,
	"verdict" text NOT NULL,
	"utilisation" double precision,
	"utilisation_bearing" double precision,
	"required_net_kpa" double precision,
	"max_pressure_kpa" double precision,
	"min_contact_ratio" double precision,
	"factor_sliding" double precision,
	"factor_overturning" double precision,
	"factor_uplift" double precision,
	"governing_combination" text DEFAULT '' NOT NULL,
	"snapshot" jsonb NOT NULL,
	"result" jsonb NOT NULL,
	"run_by" uuid NOT NULL,
	"run_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "footing_check_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "pressure_comes_from_the_revision" CHECK (("footing_check"."value_kind" = 'single') = ("footing_check"."net_allowable_kpa" is not null))
);
--> statement-breakpoint
CREATE TABLE "document" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"reference" text NOT NULL,
	"title" text NOT NULL,
	"kind" text NOT NULL,
	"author" text DEFAULT '' NOT NULL,
	"current_revision_id" uuid,
	"revision" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "document_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "document_reference" UNIQUE("project_id","reference")
);
--> statement-breakpoint
CREATE TABLE "document_revision" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"document_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"code" text NOT NULL,
	"status" text NOT NULL,
	"received_on" text NOT NULL,
	"file_name" text NOT NULL,
	"media_type" text NOT NULL,
	"size_bytes" bigint NOT NULL,
	"sha256" text NOT NULL,
	"object_key" text NOT NULL,
	"pages" integer,
	"limitations" text DEFAULT '' NOT NULL,
	"supersedes" uuid,
	"uploaded_by" uuid NOT NULL,
	"uploaded_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "document_revision_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "document_revision_number" UNIQUE("project_id","document_id","number"),
	CONSTRAINT "document_revision_code" UNIQUE("project_id","document_id","code"),
	CONSTRAINT "document_revision_object" UNIQUE("project_id","object_key")
);
--> statement-breakpoint
CREATE TABLE "upload" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"object_key" text NOT NULL,
	"file_name" text NOT NULL,
	"media_type" text NOT NULL,
	"size_bytes" bigint NOT NULL,
	"sha256" text,
	"state" text DEFAULT 'waiting' NOT NULL,
	"refusal" text,
	"started_by" uuid NOT NULL,
	"started_at" timestamp with time zone DEFAULT now() NOT NULL,
	"finished_at" timestamp with time zone,
	CONSTRAINT "upload_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "upload_object" UNIQUE("project_id","object_key")
);
--> statement-breakpoint
CREATE TABLE "footing" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"mark" text NOT NULL,
	"grid_reference" text DEFAULT '' NOT NULL,
	"owner_id" uuid,
	"stage" text DEFAULT 'designed' NOT NULL,
	"current_revision_id" uuid,
	"current_load_set_id" uuid,
	"value_id" uuid,
	"latest_check_id" uuid,
	"revision" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "footing_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "footing_mark" UNIQUE("project_id","mark")
);
--> statement-breakpoint
CREATE TABLE "footing_link" (
	"project_id" uuid NOT NULL,
	"footing_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"value_id" uuid,
	"how" text NOT NULL,
	"reason" text DEFAULT '' NOT NULL,
	"linked_by" uuid NOT NULL,
	"linked_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "footing_link_project_id_footing_id_number_pk" PRIMARY KEY("project_id","footing_id","number")
);
--> statement-breakpoint
CREATE TABLE "footing_revision" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"footing_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"easting_m" double precision NOT NULL,
	"northing_m" double precision NOT NULL,
	"orientation_deg" double precision DEFAULT 0 NOT NULL,
	"breadth_m" double precision NOT NULL,
	"length_m" double precision NOT NULL,
	"thickness_m" double precision NOT NULL,
	"ground_level_m" double precision NOT NULL,
	"founding_level_m" double precision NOT NULL,
	"load_height_m" double precision NOT NULL,
	"concrete_unit_weight_knm3" double precision DEFAULT 24 NOT NULL,
	"backfill_unit_weight_knm3" double precision DEFAULT 18 NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"source_revision_id" uuid,
	"recorded_by" uuid NOT NULL,
	"recorded_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "footing_revision_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "footing_revision_number" UNIQUE("project_id","footing_id","number"),
	CONSTRAINT "sizes_are_positive" CHECK ("footing_revision"."breadth_m" > 0 and "footing_revision"."length_m" > 0 and "footing_revision"."thickness_m" > 0
        and "footing_revision"."breadth_m" < 'Infinity' and "footing_revision"."length_m" < 'Infinity' and "footing_revision"."thickness_m" < 'Infinity'),
	CONSTRAINT "founded_below_ground" CHECK ("footing_revision"."founding_level_m" <= "footing_revision"."ground_level_m")
);
--> statement-breakpoint
CREATE TABLE "load_set" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"footing_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"combinations" jsonb NOT NULL,
	"load_basis" text NOT NULL,
	"source" text DEFAULT '' NOT NULL,
	"source_revision_id" uuid,
	"recorded_by" uuid NOT NULL,
	"recorded_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "load_set_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "load_set_number" UNIQUE("project_id","footing_id","number")
);
--> statement-breakpoint
CREATE TABLE "stage_event" (
	"project_id" uuid NOT NULL,
	"footing_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"stage" text NOT NULL,
	"reached_on" text NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"recorded_by" uuid NOT NULL,
	"recorded_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "stage_event_project_id_footing_id_number_pk" PRIMARY KEY("project_id","footing_id","number")
);
--> statement-breakpoint
CREATE TABLE "data_issue" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"document_revision_id" uuid,
	"file_name" text NOT NULL,
	"sha256" text NOT NULL,
	"edition" text NOT NULL,
	"file_project_id" text DEFAULT '' NOT NULL,
	"file_project_name" text DEFAULT '' NOT NULL,
	"issue_number" text DEFAULT '' NOT NULL,
	"issue_date" text DEFAULT '' NOT NULL,
	"data_status" text DEFAULT '' NOT NULL,
	"producer" text DEFAULT '' NOT NULL,
	"findings" jsonb NOT NULL,
	"other_groups" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"imported_by" uuid NOT NULL,
	"imported_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "data_issue_project_id_id_pk" PRIMARY KEY("project_id","id")
);
--> statement-breakpoint
CREATE TABLE "ground_unit" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"code" text NOT NULL,
	"name" text NOT NULL,
	"description" text DEFAULT '' NOT NULL,
	"soil" text NOT NULL,
	"position" integer DEFAULT 0 NOT NULL,
	"revision" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "ground_unit_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "ground_unit_code" UNIQUE("project_id","code")
);
--> statement-breakpoint
CREATE TABLE "hole" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"current_revision_id" uuid,
	"revision" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "hole_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "hole_name" UNIQUE("project_id","name")
);
--> statement-breakpoint
CREATE TABLE "hole_revision" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"hole_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"kind" text NOT NULL,
	"status" text DEFAULT '' NOT NULL,
	"easting_m" double precision,
	"northing_m" double precision,
	"given_easting_m" double precision,
	"given_northing_m" double precision,
	"given_grid" text DEFAULT '' NOT NULL,
	"ground_level_m" double precision,
	"given_datum" text DEFAULT '' NOT NULL,
	"final_depth_m" double precision,
	"started_on" text DEFAULT '' NOT NULL,
	"ended_on" text DEFAULT '' NOT NULL,
	"termination" text DEFAULT '' NOT NULL,
	"remarks" text DEFAULT '' NOT NULL,
	"logged_by" text DEFAULT '' NOT NULL,
	"data_issue_id" uuid,
	"source_line" integer,
	"source_revision_id" uuid,
	"source_page" integer,
	"reason" text DEFAULT '' NOT NULL,
	"recorded_by" uuid NOT NULL,
	"recorded_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "hole_revision_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "hole_revision_number" UNIQUE("project_id","hole_id","number")
);
--> statement-breakpoint
CREATE TABLE "spt" (
	"project_id" uuid NOT NULL,
	"hole_revision_id" uuid NOT NULL,
	"ordinal" integer NOT NULL,
	"depth_m" double precision NOT NULL,
	"kind" text DEFAULT '' NOT NULL,
	"blow_count" integer,
	"refusal" boolean DEFAULT false NOT NULL,
	"main_blows" integer,
	"main_penetration_mm" double precision,
	"seating_blows" integer,
	"increments" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"energy_ratio_percent" double precision,
	"report_text" text DEFAULT '' NOT NULL,
	"water_text" text DEFAULT '' NOT NULL,
	"casing_m" double precision,
	"source_line" integer,
	CONSTRAINT "spt_project_id_hole_revision_id_ordinal_pk" PRIMARY KEY("project_id","hole_revision_id","ordinal")
);
--> statement-breakpoint
CREATE TABLE "stratum" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"hole_revision_id" uuid NOT NULL,
	"ordinal" integer NOT NULL,
	"top_m" double precision NOT NULL,
	"base_m" double precision,
	"description" text NOT NULL,
	"legend_code" text DEFAULT '' NOT NULL,
	"geology_code" text DEFAULT '' NOT NULL,
	"soil" text DEFAULT '' NOT NULL,
	"made_ground" boolean DEFAULT false NOT NULL,
	"source_line" integer,
	CONSTRAINT "stratum_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "stratum_ordinal" UNIQUE("project_id","hole_revision_id","ordinal")
);
--> statement-breakpoint
CREATE TABLE "stratum_assignment" (
	"project_id" uuid NOT NULL,
	"stratum_id" uuid NOT NULL,
	"ground_unit_id" uuid NOT NULL,
	"assigned_by" uuid NOT NULL,
	"assigned_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "stratum_assignment_project_id_stratum_id_pk" PRIMARY KEY("project_id","stratum_id")
);
--> statement-breakpoint
CREATE TABLE "water_strike" (
	"project_id" uuid NOT NULL,
	"hole_revision_id" uuid NOT NULL,
	"ordinal" integer NOT NULL,
	"depth_m" double precision NOT NULL,
	"at" text DEFAULT '' NOT NULL,
	"casing_m" double precision,
	"sealed_m" double precision,
	"rises" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"remarks" text DEFAULT '' NOT NULL,
	"source_line" integer,
	CONSTRAINT "water_strike_project_id_hole_revision_id_ordinal_pk" PRIMARY KEY("project_id","hole_revision_id","ordinal")
);
--> statement-breakpoint
CREATE TABLE "inspection" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"seq" bigint GENERATED ALWAYS AS IDENTITY (sequence name "inspection_seq_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"footing_id" uuid NOT NULL,
	"level_reached_m" double precision,
	"ground_unit_id" uuid,
	"as_expected" boolean NOT NULL,
	"description" text NOT NULL,
	"water" text DEFAULT '' NOT NULL,
	"soft_spots" text DEFAULT '' NOT NULL,
	"tests" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"photographs" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"accepted" boolean NOT NULL,
	"conditions" text DEFAULT '' NOT NULL,
	"valid_hours" double precision,
	"inspected_at" timestamp with time zone NOT NULL,
	"inspected_by" uuid NOT NULL,
	"recorded_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "inspection_project_id_id_pk" PRIMARY KEY("project_id","id")
);
--> statement-breakpoint
CREATE TABLE "one_time_link" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"kind" text NOT NULL,
	"token_hash" text NOT NULL,
	"email" text NOT NULL,
	"person_id" uuid,
	"project_id" uuid,
	"roles" text[] DEFAULT '{}' NOT NULL,
	"invited_by" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	CONSTRAINT "one_time_link_token_hash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "person" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"qualification" text DEFAULT '' NOT NULL,
	"password_hash" text,
	"session_version" integer DEFAULT 1 NOT NULL,
	"site_administrator" boolean DEFAULT false NOT NULL,
	"disabled_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "person_email_unique" UNIQUE("email")
);
--> statement-breakpoint
CREATE TABLE "sign_in_attempt" (
	"seq" bigint PRIMARY KEY GENERATED ALWAYS AS IDENTITY (sequence name "sign_in_attempt_seq_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"account" text NOT NULL,
	"address" text NOT NULL,
	"succeeded" boolean NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "site_event" (
	"seq" bigint PRIMARY KEY GENERATED ALWAYS AS IDENTITY (sequence name "site_event_seq_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"person_id" uuid,
	"verb" text NOT NULL,
	"detail" text DEFAULT '{}' NOT NULL,
	"request_id" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "api_token" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"person_id" uuid NOT NULL,
	"name" text NOT NULL,
	"scopes" text[] NOT NULL,
	"token_hash" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"last_used_at" timestamp with time zone,
	"revoked_at" timestamp with time zone,
	CONSTRAINT "api_token_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "api_token_hash" UNIQUE("project_id","token_hash")
);
--> statement-breakpoint
CREATE TABLE "criteria" (
	"project_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"sliding_factor" double precision NOT NULL,
	"overturning_factor" double precision NOT NULL,
	"uplift_factor" double precision NOT NULL,
	"interface_angle_deg" double precision NOT NULL,
	"adhesion_kpa" double precision NOT NULL,
	"permanent_within_middle_third" boolean NOT NULL,
	"transient_min_contact_ratio" double precision NOT NULL,
	"accidental_min_contact_ratio" double precision NOT NULL,
	"nearest_hole_limit_m" double precision DEFAULT 25 NOT NULL,
	"reason" text NOT NULL,
	"set_by" uuid NOT NULL,
	"set_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "criteria_project_id_number_pk" PRIMARY KEY("project_id","number")
);
--> statement-breakpoint
CREATE TABLE "membership" (
	"project_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"role" text NOT NULL,
	"granted_at" timestamp with time zone DEFAULT now() NOT NULL,
	"granted_by" uuid,
	CONSTRAINT "membership_project_id_person_id_role_pk" PRIMARY KEY("project_id","person_id","role")
);
--> statement-breakpoint
CREATE TABLE "project" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"number" text NOT NULL,
	"title" text NOT NULL,
	"client" text DEFAULT '' NOT NULL,
	"grid_name" text NOT NULL,
	"epsg_code" integer,
	"grid_origin_easting_m" double precision DEFAULT 0 NOT NULL,
	"grid_origin_northing_m" double precision DEFAULT 0 NOT NULL,
	"grid_rotation_deg" double precision DEFAULT 0 NOT NULL,
	"grid_scale" double precision DEFAULT 1 NOT NULL,
	"datum_name" text NOT NULL,
	"structural_zero_m" double precision,
	"unit_system" text DEFAULT 'si' NOT NULL,
	"reporting_standard" text DEFAULT '' NOT NULL,
	"current_criteria" integer DEFAULT 1 NOT NULL,
	"site_plan" jsonb,
	"revision" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "project_number_unique" UNIQUE("number")
);
--> statement-breakpoint
CREATE TABLE "audit_event" (
	"project_id" uuid NOT NULL,
	"seq" bigint NOT NULL,
	"at" timestamp with time zone NOT NULL,
	"actor_id" uuid NOT NULL,
	"roles" text NOT NULL,
	"verb" text NOT NULL,
	"subject" text NOT NULL,
	"detail" text NOT NULL,
	"request_id" text NOT NULL,
	"previous_hash" text NOT NULL,
	"hash" text NOT NULL,
	CONSTRAINT "audit_event_project_id_seq_pk" PRIMARY KEY("project_id","seq")
);
--> statement-breakpoint
CREATE TABLE "idempotent_answer" (
	"project_id" uuid NOT NULL,
	"key" text NOT NULL,
	"person_id" uuid NOT NULL,
	"route" text NOT NULL,
	"body_hash" text NOT NULL,
	"status" integer NOT NULL,
	"body" jsonb NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "idempotent_answer_project_id_key_pk" PRIMARY KEY("project_id","key")
);
--> statement-breakpoint
CREATE TABLE "outbox" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"project_id" uuid,
	"message_key" text NOT NULL,
	"recipient_id" uuid,
	"recipient" text NOT NULL,
	"subject" text NOT NULL,
	"body" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"next_attempt_at" timestamp with time zone DEFAULT now() NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"sent_at" timestamp with time zone,
	"failure" text,
	CONSTRAINT "outbox_message_key_unique" UNIQUE("message_key")
);
--> statement-breakpoint
CREATE TABLE "bearing_value" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"reference" text NOT NULL,
	"zone_id" uuid NOT NULL,
	"ground_unit_id" uuid NOT NULL,
	"current_revision_id" uuid,
	"revision" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "bearing_value_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "bearing_value_reference" UNIQUE("project_id","reference"),
	CONSTRAINT "bearing_value_place" UNIQUE("project_id","zone_id","ground_unit_id")
);
--> statement-breakpoint
CREATE TABLE "bearing_value_draft" (
	"project_id" uuid NOT NULL,
	"value_id" uuid NOT NULL,
	"content" jsonb NOT NULL,
	"prepared_by" uuid NOT NULL,
	"revision" integer DEFAULT 1 NOT NULL,
	"changed_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "bearing_value_draft_project_id_value_id_pk" PRIMARY KEY("project_id","value_id")
);
--> statement-breakpoint
CREATE TABLE "bearing_value_revision" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"value_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"code" text NOT NULL,
	"kind" text NOT NULL,
	"net_allowable_kpa" double precision,
	"value_table" jsonb,
	"parameters" jsonb,
	"given_basis" text NOT NULL,
	"given" text NOT NULL,
	"given_kpa" double precision,
	"given_overburden_kpa" double precision,
	"factor_convention" text NOT NULL,
	"factor_of_safety" double precision,
	"compared_with" text NOT NULL,
	"load_basis" text NOT NULL,
	"governed_by" text NOT NULL,
	"settlement_limit_mm" double precision,
	"settlement_predicted_mm" double precision,
	"min_breadth_m" double precision,
	"max_breadth_m" double precision,
	"min_founding_depth_m" double precision,
	"highest_founding_level_m" double precision,
	"lowest_founding_level_m" double precision,
	"groundwater_level_m" double precision,
	"groundwater_basis" text NOT NULL,
	"soil_unit_weight_knm3" double precision NOT NULL,
	"drainage" text NOT NULL,
	"transient_increase" text NOT NULL,
	"transient_factor" double precision NOT NULL,
	"accidental_factor" double precision NOT NULL,
	"neighbours" text DEFAULT '' NOT NULL,
	"conditions" text DEFAULT '' NOT NULL,
	"basis" text NOT NULL,
	"confirm_by" text,
	"confirm_who" text,
	"purpose" text NOT NULL,
	"derivation" jsonb,
	"reason_code" text NOT NULL,
	"reason" text NOT NULL,
	"prepared_by" uuid NOT NULL,
	"prepared_at" timestamp with time zone NOT NULL,
	"checked_by" uuid NOT NULL,
	"checked_at" timestamp with time zone DEFAULT now() NOT NULL,
	"content_hash" text NOT NULL,
	CONSTRAINT "bearing_value_revision_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "bearing_value_revision_number" UNIQUE("project_id","value_id","number"),
	CONSTRAINT "bearing_value_revision_of_value" UNIQUE("project_id","value_id","id"),
	CONSTRAINT "bearing_value_revision_kind" UNIQUE("project_id","id","kind"),
	CONSTRAINT "bearing_value_revision_pressure" UNIQUE("project_id","id","net_allowable_kpa"),
	CONSTRAINT "bearing_value_revision_signed" UNIQUE("project_id","id","prepared_by","checked_by"),
	CONSTRAINT "checked_by_another" CHECK ("bearing_value_revision"."checked_by" <> "bearing_value_revision"."prepared_by"),
	CONSTRAINT "one_kind_of_value" CHECK (("bearing_value_revision"."kind" = 'single') = ("bearing_value_revision"."net_allowable_kpa" is not null)
        and ("bearing_value_revision"."kind" = 'table') = ("bearing_value_revision"."value_table" is not null)
        and ("bearing_value_revision"."kind" = 'parameters') = ("bearing_value_revision"."parameters" is not null)),
	CONSTRAINT "pressure_is_a_number" CHECK ("bearing_value_revision"."net_allowable_kpa" is null or ("bearing_value_revision"."net_allowable_kpa" > 0 and "bearing_value_revision"."net_allowable_kpa" < 'Infinity'))
);
--> statement-breakpoint
CREATE TABLE "revision_issue" (
	"project_id" uuid NOT NULL,
	"value_revision_id" uuid NOT NULL,
	"value_id" uuid NOT NULL,
	"prepared_by" uuid NOT NULL,
	"checked_by" uuid NOT NULL,
	"issued_by" uuid NOT NULL,
	"issued_at" timestamp with time zone DEFAULT now() NOT NULL,
	"replaces" uuid,
	CONSTRAINT "revision_issue_project_id_value_revision_id_pk" PRIMARY KEY("project_id","value_revision_id"),
	CONSTRAINT "issued_by_a_third" CHECK ("revision_issue"."issued_by" <> "revision_issue"."prepared_by" and "revision_issue"."issued_by" <> "revision_issue"."checked_by")
);
--> statement-breakpoint
CREATE TABLE "revision_withdrawal" (
	"project_id" uuid NOT NULL,
	"value_revision_id" uuid NOT NULL,
	"reason" text NOT NULL,
	"withdrawn_by" uuid NOT NULL,
	"withdrawn_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "revision_withdrawal_project_id_value_revision_id_pk" PRIMARY KEY("project_id","value_revision_id")
);
--> statement-breakpoint
CREATE TABLE "source_confirmation" (
	"project_id" uuid NOT NULL,
	"value_revision_id" uuid NOT NULL,
	"document_revision_id" uuid NOT NULL,
	"reason" text NOT NULL,
	"confirmed_by" uuid NOT NULL,
	"confirmed_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "source_confirmation_project_id_value_revision_id_document_revision_id_pk" PRIMARY KEY("project_id","value_revision_id","document_revision_id")
);
--> statement-breakpoint
CREATE TABLE "value_source" (
	"project_id" uuid NOT NULL,
	"value_revision_id" uuid NOT NULL,
	"ordinal" integer NOT NULL,
	"document_revision_id" uuid NOT NULL,
	"page" integer,
	"clause" text DEFAULT '' NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"holes" text[] DEFAULT '{}' NOT NULL,
	CONSTRAINT "value_source_project_id_value_revision_id_ordinal_pk" PRIMARY KEY("project_id","value_revision_id","ordinal")
);
--> statement-breakpoint
CREATE TABLE "zone" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"current_revision_id" uuid,
	"revision" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "zone_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "zone_name" UNIQUE("project_id","name")
);
--> statement-breakpoint
CREATE TABLE "zone_ground_unit" (
	"project_id" uuid NOT NULL,
	"zone_id" uuid NOT NULL,
	"ground_unit_id" uuid NOT NULL,
	CONSTRAINT "zone_ground_unit_project_id_zone_id_ground_unit_id_pk" PRIMARY KEY("project_id","zone_id","ground_unit_id")
);
--> statement-breakpoint
CREATE TABLE "zone_revision" (
	"project_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"zone_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"ring_m" jsonb NOT NULL,
	"boundary" text DEFAULT 'interpolated' NOT NULL,
	"reason" text DEFAULT '' NOT NULL,
	"drawn_by" uuid NOT NULL,
	"drawn_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "zone_revision_project_id_id_pk" PRIMARY KEY("project_id","id"),
	CONSTRAINT "zone_revision_number" UNIQUE("project_id","zone_id","number")
);
--> statement-breakpoint
ALTER TABLE "change" ADD CONSTRAINT "change_project_id_project_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."project"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "change" ADD CONSTRAINT "change_made_by_person_id_fk" FOREIGN KEY ("made_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "change_closure" ADD CONSTRAINT "change_closure_closed_by_person_id_fk" FOREIGN KEY ("closed_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "change_closure" ADD CONSTRAINT "change_closure_project_id_change_id_change_project_id_id_fk" FOREIGN KEY ("project_id","change_id") REFERENCES "public"."change"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "consequence" ADD CONSTRAINT "consequence_project_id_change_id_change_project_id_id_fk" FOREIGN KEY ("project_id","change_id") REFERENCES "public"."change"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "consequence" ADD CONSTRAINT "consequence_project_id_footing_id_footing_project_id_id_fk" FOREIGN KEY ("project_id","footing_id") REFERENCES "public"."footing"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "disposition" ADD CONSTRAINT "disposition_answered_by_person_id_fk" FOREIGN KEY ("answered_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "disposition" ADD CONSTRAINT "disposition_project_id_consequence_id_consequence_project_id_id_fk" FOREIGN KEY ("project_id","consequence_id") REFERENCES "public"."consequence"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "disposition" ADD CONSTRAINT "disposition_project_id_check_id_footing_check_project_id_id_fk" FOREIGN KEY ("project_id","check_id") REFERENCES "public"."footing_check"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_check" ADD CONSTRAINT "footing_check_run_by_person_id_fk" FOREIGN KEY ("run_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_check" ADD CONSTRAINT "footing_check_project_id_footing_id_footing_project_id_id_fk" FOREIGN KEY ("project_id","footing_id") REFERENCES "public"."footing"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_check" ADD CONSTRAINT "footing_check_project_id_footing_revision_id_footing_revision_project_id_id_fk" FOREIGN KEY ("project_id","footing_revision_id") REFERENCES "public"."footing_revision"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_check" ADD CONSTRAINT "footing_check_project_id_load_set_id_load_set_project_id_id_fk" FOREIGN KEY ("project_id","load_set_id") REFERENCES "public"."load_set"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_check" ADD CONSTRAINT "footing_check_project_id_zone_revision_id_zone_revision_project_id_id_fk" FOREIGN KEY ("project_id","zone_revision_id") REFERENCES "public"."zone_revision"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_check" ADD CONSTRAINT "footing_check_project_id_criteria_number_criteria_project_id_number_fk" FOREIGN KEY ("project_id","criteria_number") REFERENCES "public"."criteria"("project_id","number") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_check" ADD CONSTRAINT "footing_check_project_id_value_id_value_revision_id_bearing_value_revision_project_id_value_id_id_fk" FOREIGN KEY ("project_id","value_id","value_revision_id") REFERENCES "public"."bearing_value_revision"("project_id","value_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_check" ADD CONSTRAINT "footing_check_project_id_value_revision_id_revision_issue_project_id_value_revision_id_fk" FOREIGN KEY ("project_id","value_revision_id") REFERENCES "public"."revision_issue"("project_id","value_revision_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_check" ADD CONSTRAINT "footing_check_project_id_value_revision_id_value_kind_bearing_value_revision_project_id_id_kind_fk" FOREIGN KEY ("project_id","value_revision_id","value_kind") REFERENCES "public"."bearing_value_revision"("project_id","id","kind") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_check" ADD CONSTRAINT "footing_check_project_id_value_revision_id_net_allowable_kpa_bearing_value_revision_project_id_id_net_allowable_kpa_fk" FOREIGN KEY ("project_id","value_revision_id","net_allowable_kpa") REFERENCES "public"."bearing_value_revision"("project_id","id","net_allowable_kpa") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "document" ADD CONSTRAINT "document_project_id_project_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."project"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "document_revision" ADD CONSTRAINT "document_revision_uploaded_by_person_id_fk" FOREIGN KEY ("uploaded_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "document_revision" ADD CONSTRAINT "document_revision_project_id_document_id_document_project_id_id_fk" FOREIGN KEY ("project_id","document_id") REFERENCES "public"."document"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "upload" ADD CONSTRAINT "upload_project_id_project_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."project"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "upload" ADD CONSTRAINT "upload_started_by_person_id_fk" FOREIGN KEY ("started_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing" ADD CONSTRAINT "footing_project_id_project_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."project"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing" ADD CONSTRAINT "footing_owner_id_person_id_fk" FOREIGN KEY ("owner_id") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing" ADD CONSTRAINT "footing_project_id_value_id_bearing_value_project_id_id_fk" FOREIGN KEY ("project_id","value_id") REFERENCES "public"."bearing_value"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_link" ADD CONSTRAINT "footing_link_linked_by_person_id_fk" FOREIGN KEY ("linked_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_link" ADD CONSTRAINT "footing_link_project_id_footing_id_footing_project_id_id_fk" FOREIGN KEY ("project_id","footing_id") REFERENCES "public"."footing"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_link" ADD CONSTRAINT "footing_link_project_id_value_id_bearing_value_project_id_id_fk" FOREIGN KEY ("project_id","value_id") REFERENCES "public"."bearing_value"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_revision" ADD CONSTRAINT "footing_revision_recorded_by_person_id_fk" FOREIGN KEY ("recorded_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "footing_revision" ADD CONSTRAINT "footing_revision_project_id_footing_id_footing_project_id_id_fk" FOREIGN KEY ("project_id","footing_id") REFERENCES "public"."footing"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "load_set" ADD CONSTRAINT "load_set_recorded_by_person_id_fk" FOREIGN KEY ("recorded_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "load_set" ADD CONSTRAINT "load_set_project_id_footing_id_footing_project_id_id_fk" FOREIGN KEY ("project_id","footing_id") REFERENCES "public"."footing"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stage_event" ADD CONSTRAINT "stage_event_recorded_by_person_id_fk" FOREIGN KEY ("recorded_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stage_event" ADD CONSTRAINT "stage_event_project_id_footing_id_footing_project_id_id_fk" FOREIGN KEY ("project_id","footing_id") REFERENCES "public"."footing"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "data_issue" ADD CONSTRAINT "data_issue_project_id_project_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."project"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "data_issue" ADD CONSTRAINT "data_issue_imported_by_person_id_fk" FOREIGN KEY ("imported_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "data_issue" ADD CONSTRAINT "data_issue_project_id_document_revision_id_document_revision_project_id_id_fk" FOREIGN KEY ("project_id","document_revision_id") REFERENCES "public"."document_revision"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ground_unit" ADD CONSTRAINT "ground_unit_project_id_project_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."project"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hole" ADD CONSTRAINT "hole_project_id_project_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."project"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hole_revision" ADD CONSTRAINT "hole_revision_recorded_by_person_id_fk" FOREIGN KEY ("recorded_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hole_revision" ADD CONSTRAINT "hole_revision_project_id_hole_id_hole_project_id_id_fk" FOREIGN KEY ("project_id","hole_id") REFERENCES "public"."hole"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hole_revision" ADD CONSTRAINT "hole_revision_project_id_data_issue_id_data_issue_project_id_id_fk" FOREIGN KEY ("project_id","data_issue_id") REFERENCES "public"."data_issue"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hole_revision" ADD CONSTRAINT "hole_revision_project_id_source_revision_id_document_revision_project_id_id_fk" FOREIGN KEY ("project_id","source_revision_id") REFERENCES "public"."document_revision"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "spt" ADD CONSTRAINT "spt_project_id_hole_revision_id_hole_revision_project_id_id_fk" FOREIGN KEY ("project_id","hole_revision_id") REFERENCES "public"."hole_revision"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stratum" ADD CONSTRAINT "stratum_project_id_hole_revision_id_hole_revision_project_id_id_fk" FOREIGN KEY ("project_id","hole_revision_id") REFERENCES "public"."hole_revision"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stratum_assignment" ADD CONSTRAINT "stratum_assignment_assigned_by_person_id_fk" FOREIGN KEY ("assigned_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stratum_assignment" ADD CONSTRAINT "stratum_assignment_project_id_stratum_id_stratum_project_id_id_fk" FOREIGN KEY ("project_id","stratum_id") REFERENCES "public"."stratum"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stratum_assignment" ADD CONSTRAINT "stratum_assignment_project_id_ground_unit_id_ground_unit_project_id_id_fk" FOREIGN KEY ("project_id","ground_unit_id") REFERENCES "public"."ground_unit"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "water_strike" ADD CONSTRAINT "water_strike_project_id_hole_revision_id_hole_revision_project_id_id_fk" FOREIGN KEY ("project_id","hole_revision_id") REFERENCES "public"."hole_revision"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "inspection" ADD CONSTRAINT "inspection_inspected_by_person_id_fk" FOREIGN KEY ("inspected_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "inspection" ADD CONSTRAINT "inspection_project_id_footing_id_footing_project_id_id_fk" FOREIGN KEY ("project_id","footing_id") REFERENCES "public"."footing"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "inspection" ADD CONSTRAINT "inspection_project_id_ground_unit_id_ground_unit_project_id_id_fk" FOREIGN KEY ("project_id","ground_unit_id") REFERENCES "public"."ground_unit"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "one_time_link" ADD CONSTRAINT "one_time_link_person_id_person_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "one_time_link" ADD CONSTRAINT "one_time_link_invited_by_person_id_fk" FOREIGN KEY ("invited_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "api_token" ADD CONSTRAINT "api_token_project_id_project_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."project"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "api_token" ADD CONSTRAINT "api_token_person_id_person_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "criteria" ADD CONSTRAINT "criteria_project_id_project_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."project"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "criteria" ADD CONSTRAINT "criteria_set_by_person_id_fk" FOREIGN KEY ("set_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "membership" ADD CONSTRAINT "membership_project_id_project_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."project"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "membership" ADD CONSTRAINT "membership_person_id_person_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "membership" ADD CONSTRAINT "membership_granted_by_person_id_fk" FOREIGN KEY ("granted_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit_event" ADD CONSTRAINT "audit_event_project_id_project_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."project"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "idempotent_answer" ADD CONSTRAINT "idempotent_answer_project_id_project_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."project"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "outbox" ADD CONSTRAINT "outbox_recipient_id_person_id_fk" FOREIGN KEY ("recipient_id") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bearing_value" ADD CONSTRAINT "bearing_value_project_id_zone_id_ground_unit_id_zone_ground_unit_project_id_zone_id_ground_unit_id_fk" FOREIGN KEY ("project_id","zone_id","ground_unit_id") REFERENCES "public"."zone_ground_unit"("project_id","zone_id","ground_unit_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bearing_value_draft" ADD CONSTRAINT "bearing_value_draft_prepared_by_person_id_fk" FOREIGN KEY ("prepared_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bearing_value_draft" ADD CONSTRAINT "bearing_value_draft_project_id_value_id_bearing_value_project_id_id_fk" FOREIGN KEY ("project_id","value_id") REFERENCES "public"."bearing_value"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bearing_value_revision" ADD CONSTRAINT "bearing_value_revision_prepared_by_person_id_fk" FOREIGN KEY ("prepared_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bearing_value_revision" ADD CONSTRAINT "bearing_value_revision_checked_by_person_id_fk" FOREIGN KEY ("checked_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bearing_value_revision" ADD CONSTRAINT "bearing_value_revision_project_id_value_id_bearing_value_project_id_id_fk" FOREIGN KEY ("project_id","value_id") REFERENCES "public"."bearing_value"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_issue" ADD CONSTRAINT "revision_issue_issued_by_person_id_fk" FOREIGN KEY ("issued_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_issue" ADD CONSTRAINT "revision_issue_project_id_value_id_value_revision_id_bearing_value_revision_project_id_value_id_id_fk" FOREIGN KEY ("project_id","value_id","value_revision_id") REFERENCES "public"."bearing_value_revision"("project_id","value_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_issue" ADD CONSTRAINT "revision_issue_project_id_value_revision_id_prepared_by_checked_by_bearing_value_revision_project_id_id_prepared_by_checked_by_fk" FOREIGN KEY ("project_id","value_revision_id","prepared_by","checked_by") REFERENCES "public"."bearing_value_revision"("project_id","id","prepared_by","checked_by") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_withdrawal" ADD CONSTRAINT "revision_withdrawal_withdrawn_by_person_id_fk" FOREIGN KEY ("withdrawn_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_withdrawal" ADD CONSTRAINT "revision_withdrawal_project_id_value_revision_id_revision_issue_project_id_value_revision_id_fk" FOREIGN KEY ("project_id","value_revision_id") REFERENCES "public"."revision_issue"("project_id","value_revision_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "source_confirmation" ADD CONSTRAINT "source_confirmation_confirmed_by_person_id_fk" FOREIGN KEY ("confirmed_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "source_confirmation" ADD CONSTRAINT "source_confirmation_project_id_value_revision_id_bearing_value_revision_project_id_id_fk" FOREIGN KEY ("project_id","value_revision_id") REFERENCES "public"."bearing_value_revision"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "source_confirmation" ADD CONSTRAINT "source_confirmation_project_id_document_revision_id_document_revision_project_id_id_fk" FOREIGN KEY ("project_id","document_revision_id") REFERENCES "public"."document_revision"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "value_source" ADD CONSTRAINT "value_source_project_id_value_revision_id_bearing_value_revision_project_id_id_fk" FOREIGN KEY ("project_id","value_revision_id") REFERENCES "public"."bearing_value_revision"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "value_source" ADD CONSTRAINT "value_source_project_id_document_revision_id_document_revision_project_id_id_fk" FOREIGN KEY ("project_id","document_revision_id") REFERENCES "public"."document_revision"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "zone" ADD CONSTRAINT "zone_project_id_project_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."project"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "zone_ground_unit" ADD CONSTRAINT "zone_ground_unit_project_id_zone_id_zone_project_id_id_fk" FOREIGN KEY ("project_id","zone_id") REFERENCES "public"."zone"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "zone_ground_unit" ADD CONSTRAINT "zone_ground_unit_project_id_ground_unit_id_ground_unit_project_id_id_fk" FOREIGN KEY ("project_id","ground_unit_id") REFERENCES "public"."ground_unit"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "zone_revision" ADD CONSTRAINT "zone_revision_drawn_by_person_id_fk" FOREIGN KEY ("drawn_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "zone_revision" ADD CONSTRAINT "zone_revision_project_id_zone_id_zone_project_id_id_fk" FOREIGN KEY ("project_id","zone_id") REFERENCES "public"."zone"("project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "change_order" ON "change" USING btree ("project_id","seq");--> statement-breakpoint
CREATE INDEX "change_value" ON "change" USING btree ("project_id","value_id");--> statement-breakpoint
CREATE INDEX "footing_check_history" ON "footing_check" USING btree ("project_id","footing_id","seq");--> statement-breakpoint
CREATE INDEX "footing_check_value_required" ON "footing_check" USING btree ("project_id","value_id","required_net_kpa");--> statement-breakpoint
CREATE INDEX "document_revision_hash" ON "document_revision" USING btree ("project_id","sha256");--> statement-breakpoint
CREATE INDEX "footing_value" ON "footing" USING btree ("project_id","value_id");--> statement-breakpoint
CREATE INDEX "stratum_assignment_unit" ON "stratum_assignment" USING btree ("project_id","ground_unit_id");--> statement-breakpoint
CREATE INDEX "inspection_footing" ON "inspection" USING btree ("project_id","footing_id","seq");--> statement-breakpoint
CREATE INDEX "sign_in_attempt_account" ON "sign_in_attempt" USING btree ("account","at");--> statement-breakpoint
CREATE INDEX "sign_in_attempt_address" ON "sign_in_attempt" USING btree ("address","at");--> statement-breakpoint
CREATE INDEX "audit_event_subject" ON "audit_event" USING btree ("project_id","subject");--> statement-breakpoint
CREATE INDEX "outbox_waiting" ON "outbox" USING btree ("sent_at","next_attempt_at");--> statement-breakpoint
CREATE INDEX "value_source_document" ON "value_source" USING btree ("project_id","document_revision_id");