CREATE SCHEMA "identity";
--> statement-breakpoint
CREATE TABLE "actions" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"kind" text NOT NULL,
	"v" integer NOT NULL,
	"happened_at" timestamp with time zone NOT NULL,
	"happened_on" date NOT NULL,
	"recorded_at" timestamp with time zone NOT NULL,
	"seq" bigint GENERATED ALWAYS AS IDENTITY (sequence name "actions_seq_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"membership_id" uuid NOT NULL,
	"request_hash" text NOT NULL,
	"queued" boolean NOT NULL,
	CONSTRAINT "actions_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "actions_kind" CHECK ("kind" in ('mix', 'load', 'hold', 'release', 'discard', 'receipt', 'decision', 'setting-change', 'order-draft', 'order-send', 'order-cancel', 'void')),
	CONSTRAINT "actions_v" CHECK ("actions"."v" > 0),
	CONSTRAINT "actions_request_hash" CHECK ("actions"."request_hash" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
ALTER TABLE "actions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "setting_changes" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"subject" text NOT NULL,
	"subject_id" uuid NOT NULL,
	"field" text NOT NULL,
	"old_value" text,
	"new_value" text,
	CONSTRAINT "setting_changes_pk" PRIMARY KEY("darkroom_id","action_id","field"),
	CONSTRAINT "setting_changes_subject" CHECK ("subject" in ('darkroom', 'pack', 'supplier', 'supplier-pack'))
);
--> statement-breakpoint
ALTER TABLE "setting_changes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "voids" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"voided_action_id" uuid NOT NULL,
	"reason" text,
	CONSTRAINT "voids_pk" PRIMARY KEY("darkroom_id","action_id"),
	CONSTRAINT "voids_voided_uq" UNIQUE("darkroom_id","voided_action_id"),
	CONSTRAINT "voids_not_itself" CHECK ("voids"."action_id" <> "voids"."voided_action_id")
);
--> statement-breakpoint
ALTER TABLE "voids" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "bottle_totals" (
	"darkroom_id" uuid NOT NULL,
	"bottle_id" uuid NOT NULL,
	"totals" jsonb,
	"in_use" boolean NOT NULL,
	"volume_ul" bigint NOT NULL,
	"next_look_at" timestamp with time zone,
	CONSTRAINT "bottle_totals_pk" PRIMARY KEY("darkroom_id","bottle_id"),
	CONSTRAINT "bottle_totals_volume" CHECK ("bottle_totals"."volume_ul" >= 0),
	CONSTRAINT "bottle_totals_in_use_real" CHECK (not ("bottle_totals"."in_use" and "bottle_totals"."totals" is null))
);
--> statement-breakpoint
ALTER TABLE "bottle_totals" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "bottles" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"code" text NOT NULL,
	"chemistry_version_id" uuid NOT NULL,
	"material" text,
	"made_by_action_id" uuid NOT NULL,
	"cost_minor" bigint,
	"currency" text,
	CONSTRAINT "bottles_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "bottles_code_uq" UNIQUE("darkroom_id","code"),
	CONSTRAINT "bottles_material" CHECK ("material" in ('film', 'rc-paper', 'fb-paper')),
	CONSTRAINT "bottles_cost" CHECK (("bottles"."cost_minor" is null) = ("bottles"."currency" is null))
);
--> statement-breakpoint
ALTER TABLE "bottles" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "counters" (
	"darkroom_id" uuid NOT NULL,
	"name" text NOT NULL,
	"last" integer NOT NULL,
	CONSTRAINT "counters_pk" PRIMARY KEY("darkroom_id","name"),
	CONSTRAINT "counters_last" CHECK ("counters"."last" >= 0)
);
--> statement-breakpoint
ALTER TABLE "counters" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "chemistries" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"created_at" timestamp with time zone NOT NULL,
	"archived_at" timestamp with time zone,
	CONSTRAINT "chemistries_pk" PRIMARY KEY("darkroom_id","id")
);
--> statement-breakpoint
ALTER TABLE "chemistries" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "chemistry_versions" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"chemistry_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"document" jsonb NOT NULL,
	"created_at" timestamp with time zone NOT NULL,
	"created_by" uuid,
	CONSTRAINT "chemistry_versions_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "chemistry_versions_number_uq" UNIQUE("darkroom_id","chemistry_id","number"),
	CONSTRAINT "chemistry_versions_number" CHECK ("chemistry_versions"."number" > 0),
	CONSTRAINT "chemistry_versions_schema" CHECK (("chemistry_versions"."document" ->> 'schema') = '1')
);
--> statement-breakpoint
ALTER TABLE "chemistry_versions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "discards" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"bottle_id" uuid NOT NULL,
	"waste_route" text NOT NULL,
	"note" text,
	CONSTRAINT "discards_pk" PRIMARY KEY("darkroom_id","action_id","bottle_id")
);
--> statement-breakpoint
ALTER TABLE "discards" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "holds" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"bottle_id" uuid NOT NULL,
	"change" text NOT NULL,
	"reason" text NOT NULL,
	CONSTRAINT "holds_pk" PRIMARY KEY("darkroom_id","action_id","bottle_id"),
	CONSTRAINT "holds_change" CHECK ("change" in ('hold', 'release'))
);
--> statement-breakpoint
ALTER TABLE "holds" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "identity"."credentials" (
	"person_id" uuid PRIMARY KEY NOT NULL,
	"passphrase_hash" text NOT NULL,
	"changed_at" timestamp with time zone NOT NULL,
	CONSTRAINT "credentials_argon2id" CHECK ("identity"."credentials"."passphrase_hash" like '$argon2id$%')
);
--> statement-breakpoint
CREATE TABLE "identity"."darkrooms" (
	"id" uuid PRIMARY KEY NOT NULL,
	"short_name" text NOT NULL,
	"name" text NOT NULL,
	"zone" text NOT NULL,
	"next_check_at" timestamp with time zone,
	"created_at" timestamp with time zone NOT NULL,
	CONSTRAINT "darkrooms_short_name" UNIQUE("short_name"),
	CONSTRAINT "darkrooms_short_name_shape" CHECK ("identity"."darkrooms"."short_name" ~ '^[a-z0-9]+(-[a-z0-9]+)*$' and length("identity"."darkrooms"."short_name") <= 32)
);
--> statement-breakpoint
CREATE TABLE "identity"."one_time_codes" (
	"hash" text PRIMARY KEY NOT NULL,
	"purpose" text NOT NULL,
	"person_id" uuid,
	"email" text NOT NULL,
	"created_at" timestamp with time zone NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	CONSTRAINT "one_time_codes_purpose" CHECK ("identity"."one_time_codes"."purpose" in ('reset', 'invitation', 'change-of-address')),
	CONSTRAINT "one_time_codes_hash" CHECK (length("identity"."one_time_codes"."hash") = 64)
);
--> statement-breakpoint
CREATE TABLE "identity"."people" (
	"id" uuid PRIMARY KEY NOT NULL,
	"email" text,
	"name" text NOT NULL,
	"created_at" timestamp with time zone NOT NULL,
	"deleted_at" timestamp with time zone,
	CONSTRAINT "people_email" UNIQUE("email"),
	CONSTRAINT "people_email_lower" CHECK ("identity"."people"."email" = lower("identity"."people"."email")),
	CONSTRAINT "people_email_or_deleted" CHECK (("identity"."people"."email" is null) = ("identity"."people"."deleted_at" is not null))
);
--> statement-breakpoint
CREATE TABLE "identity"."rate_counters" (
	"subject" text NOT NULL,
	"key" text NOT NULL,
	"window_start" timestamp with time zone NOT NULL,
	"count" integer NOT NULL,
	"blocked_until" timestamp with time zone,
	CONSTRAINT "rate_counters_pk" PRIMARY KEY("subject","key"),
	CONSTRAINT "rate_counters_count" CHECK ("identity"."rate_counters"."count" >= 0)
);
--> statement-breakpoint
CREATE TABLE "identity"."refresh_tokens" (
	"hash" text PRIMARY KEY NOT NULL,
	"session_id" uuid NOT NULL,
	"predecessor_hash" text,
	"created_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	"superseded_at" timestamp with time zone,
	CONSTRAINT "refresh_tokens_hash" CHECK (length("identity"."refresh_tokens"."hash") = 64)
);
--> statement-breakpoint
CREATE TABLE "identity"."sessions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"person_id" uuid NOT NULL,
	"created_at" timestamp with time zone NOT NULL,
	"last_used_at" timestamp with time zone NOT NULL,
	"ended_at" timestamp with time zone,
	"ended_why" text,
	CONSTRAINT "sessions_ended_why" CHECK ("identity"."sessions"."ended_why" in ('signed-out', 'reuse', 'passphrase-changed', 'ended-elsewhere')),
	CONSTRAINT "sessions_ended" CHECK (("identity"."sessions"."ended_at" is null) = ("identity"."sessions"."ended_why" is null))
);
--> statement-breakpoint
CREATE TABLE "line_steps" (
	"darkroom_id" uuid NOT NULL,
	"line_version_id" uuid NOT NULL,
	"step_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"kind" text NOT NULL,
	"name" text NOT NULL,
	"material" text,
	"seconds" integer,
	"changes" integer,
	CONSTRAINT "line_steps_pk" PRIMARY KEY("darkroom_id","line_version_id","step_id"),
	CONSTRAINT "line_steps_position_uq" UNIQUE("darkroom_id","line_version_id","position"),
	CONSTRAINT "line_steps_kind" CHECK ("kind" in ('bottle', 'water')),
	CONSTRAINT "line_steps_material" CHECK ("material" in ('film', 'rc-paper', 'fb-paper')),
	CONSTRAINT "line_steps_numbers" CHECK ("line_steps"."seconds" > 0 and "line_steps"."changes" > 0 and "line_steps"."position" >= 0)
);
--> statement-breakpoint
ALTER TABLE "line_steps" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "line_versions" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"line_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"name" text NOT NULL,
	"process" text NOT NULL,
	"created_at" timestamp with time zone NOT NULL,
	CONSTRAINT "line_versions_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "line_versions_number_uq" UNIQUE("darkroom_id","line_id","number"),
	CONSTRAINT "line_versions_number" CHECK ("line_versions"."number" > 0)
);
--> statement-breakpoint
ALTER TABLE "line_versions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "lines" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"created_at" timestamp with time zone NOT NULL,
	CONSTRAINT "lines_pk" PRIMARY KEY("darkroom_id","id")
);
--> statement-breakpoint
ALTER TABLE "lines" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "placement_changes" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"step_id" uuid NOT NULL,
	"bottle_id" uuid,
	CONSTRAINT "placement_changes_pk" PRIMARY KEY("darkroom_id","action_id","step_id")
);
--> statement-breakpoint
ALTER TABLE "placement_changes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "placements" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"step_id" uuid NOT NULL,
	"bottle_id" uuid NOT NULL,
	"from_at" timestamp with time zone NOT NULL,
	"to_at" timestamp with time zone,
	CONSTRAINT "placements_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "placements_times" CHECK ("placements"."to_at" >= "placements"."from_at")
);
--> statement-breakpoint
ALTER TABLE "placements" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "steps" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"line_id" uuid NOT NULL,
	CONSTRAINT "steps_pk" PRIMARY KEY("darkroom_id","id")
);
--> statement-breakpoint
ALTER TABLE "steps" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "decisions" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"load_action_id" uuid NOT NULL,
	"decision" text NOT NULL,
	"reason" text NOT NULL,
	CONSTRAINT "decisions_pk" PRIMARY KEY("darkroom_id","action_id"),
	CONSTRAINT "decisions_decision" CHECK ("decision" in ('accept'))
);
--> statement-breakpoint
ALTER TABLE "decisions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "load_film" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"ordinal" integer NOT NULL,
	"format" text NOT NULL,
	"width_mm" integer,
	"height_mm" integer,
	"count" integer NOT NULL,
	"film_class" text NOT NULL,
	"owner_membership_id" uuid,
	"owner_guest_id" uuid,
	CONSTRAINT "load_film_pk" PRIMARY KEY("darkroom_id","action_id","ordinal"),
	CONSTRAINT "load_film_count" CHECK ("load_film"."count" > 0),
	CONSTRAINT "load_film_size" CHECK (("load_film"."format" = 'sheet') = ("load_film"."width_mm" is not null and "load_film"."height_mm" is not null)),
	CONSTRAINT "load_film_owner" CHECK (num_nonnulls("load_film"."owner_membership_id", "load_film"."owner_guest_id") = 1)
);
--> statement-breakpoint
ALTER TABLE "load_film" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "load_steps" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"bottle_id" uuid NOT NULL,
	"material" text NOT NULL,
	"nominal_e4" bigint NOT NULL,
	"factor_e4" integer,
	"counted_e4" bigint NOT NULL,
	"taken_ul" bigint NOT NULL,
	"flags" text[] NOT NULL,
	CONSTRAINT "load_steps_pk" PRIMARY KEY("darkroom_id","action_id","bottle_id"),
	CONSTRAINT "load_steps_material" CHECK ("material" in ('film', 'rc-paper', 'fb-paper')),
	CONSTRAINT "load_steps_amounts" CHECK ("load_steps"."nominal_e4" > 0 and "load_steps"."counted_e4" > 0 and "load_steps"."factor_e4" > 0 and "load_steps"."taken_ul" >= 0),
	CONSTRAINT "load_steps_flags" CHECK (flags <@ array['over_capacity', 'past_date', 'on_hold', 'after_discard', 'incompatible', 'wrong_material', 'volume_short']::text[])
);
--> statement-breakpoint
ALTER TABLE "load_steps" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "loads" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"line_version_id" uuid,
	"flags" text[] NOT NULL,
	"note" text,
	CONSTRAINT "loads_pk" PRIMARY KEY("darkroom_id","action_id"),
	CONSTRAINT "loads_flags" CHECK ("loads"."flags" <@ array['time_unsure', 'late']::text[])
);
--> statement-breakpoint
ALTER TABLE "loads" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "mix_draws" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"ordinal" integer NOT NULL,
	"lot_id" uuid,
	"pack_part_id" uuid,
	"opened_pack_id" uuid,
	"parent_bottle_id" uuid,
	"volume_ul" bigint,
	"mass_mg" bigint,
	CONSTRAINT "mix_draws_pk" PRIMARY KEY("darkroom_id","action_id","ordinal"),
	CONSTRAINT "mix_draws_amount" CHECK (num_nonnulls("mix_draws"."volume_ul", "mix_draws"."mass_mg") = 1 and coalesce("mix_draws"."volume_ul", "mix_draws"."mass_mg") > 0),
	CONSTRAINT "mix_draws_from" CHECK (num_nonnulls("mix_draws"."lot_id", "mix_draws"."parent_bottle_id") <= 1)
);
--> statement-breakpoint
ALTER TABLE "mix_draws" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "mixes" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"bottle_id" uuid NOT NULL,
	"volume_ul" bigint NOT NULL,
	"container_size_ul" bigint NOT NULL,
	"container_kind" text NOT NULL,
	"container_material" text,
	"ready_at" timestamp with time zone,
	"note" text,
	CONSTRAINT "mixes_pk" PRIMARY KEY("darkroom_id","action_id"),
	CONSTRAINT "mixes_container_kind" CHECK ("container_kind" in ('bottle', 'floating-lid', 'tray', 'tank')),
	CONSTRAINT "mixes_container_material" CHECK ("container_material" in ('glass', 'pet', 'soft-polyethylene', 'concertina')),
	CONSTRAINT "mixes_volume" CHECK ("mixes"."volume_ul" > 0 and "mixes"."container_size_ul" >= "mixes"."volume_ul")
);
--> statement-breakpoint
ALTER TABLE "mixes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "deliveries" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"order_id" uuid,
	"note" text,
	CONSTRAINT "deliveries_pk" PRIMARY KEY("darkroom_id","action_id")
);
--> statement-breakpoint
ALTER TABLE "deliveries" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "delivery_lines" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"ordinal" integer NOT NULL,
	"order_line_id" uuid,
	"lot_id" uuid NOT NULL,
	"count" integer NOT NULL,
	"price_minor" bigint,
	"currency" text,
	CONSTRAINT "delivery_lines_pk" PRIMARY KEY("darkroom_id","action_id","ordinal"),
	CONSTRAINT "delivery_lines_count" CHECK ("delivery_lines"."count" > 0 and "delivery_lines"."price_minor" >= 0 and ("delivery_lines"."price_minor" is null) = ("delivery_lines"."currency" is null))
);
--> statement-breakpoint
ALTER TABLE "delivery_lines" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "order_changes" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"order_id" uuid NOT NULL,
	"change" text NOT NULL,
	"reason" text,
	CONSTRAINT "order_changes_pk" PRIMARY KEY("darkroom_id","action_id"),
	CONSTRAINT "order_changes_change" CHECK ("change" in ('drafted', 'sent', 'cancelled'))
);
--> statement-breakpoint
ALTER TABLE "order_changes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "order_lines" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"order_id" uuid NOT NULL,
	"supplier_pack_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"count" integer NOT NULL,
	"price_minor" bigint,
	"received" integer NOT NULL,
	"cancelled" integer NOT NULL,
	CONSTRAINT "order_lines_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "order_lines_position_uq" UNIQUE("darkroom_id","order_id","position"),
	CONSTRAINT "order_lines_counts" CHECK ("order_lines"."count" >= 0 and "order_lines"."received" >= 0 and "order_lines"."cancelled" >= 0 and "order_lines"."price_minor" >= 0)
);
--> statement-breakpoint
ALTER TABLE "order_lines" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "orders" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"number" integer NOT NULL,
	"supplier_id" uuid NOT NULL,
	"state" text NOT NULL,
	"currency" text NOT NULL,
	"note" text,
	"revision" integer NOT NULL,
	"drafted_by" uuid NOT NULL,
	"drafted_at" timestamp with time zone NOT NULL,
	"sent_by" uuid,
	"sent_at" timestamp with time zone,
	"closed_at" timestamp with time zone,
	CONSTRAINT "orders_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "orders_number_uq" UNIQUE("darkroom_id","number"),
	CONSTRAINT "orders_state" CHECK ("state" in ('draft', 'sent', 'received', 'cancelled')),
	CONSTRAINT "orders_currency" CHECK ("orders"."currency" ~ '^[A-Z]{3}$')
);
--> statement-breakpoint
ALTER TABLE "orders" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "stock_movements" (
	"darkroom_id" uuid NOT NULL,
	"action_id" uuid NOT NULL,
	"ordinal" integer NOT NULL,
	"kind" text NOT NULL,
	"pack_id" uuid NOT NULL,
	"lot_id" uuid NOT NULL,
	"unopened_delta" integer NOT NULL,
	"opened_pack_id" uuid,
	"delta_ul" bigint,
	"delta_mg" bigint,
	"seen" integer,
	"reason" text,
	CONSTRAINT "stock_movements_pk" PRIMARY KEY("darkroom_id","action_id","ordinal"),
	CONSTRAINT "stock_movements_kind" CHECK ("kind" in ('received', 'opened', 'drawn', 'counted', 'written-off')),
	CONSTRAINT "stock_movements_amount" CHECK (("stock_movements"."opened_pack_id" is not null) = (num_nonnulls("stock_movements"."delta_ul", "stock_movements"."delta_mg") = 1))
);
--> statement-breakpoint
ALTER TABLE "stock_movements" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "darkroom_settings" (
	"darkroom_id" uuid NOT NULL,
	"temperature_unit" text NOT NULL,
	"volume_unit" text NOT NULL,
	"currency" text NOT NULL,
	"low_share_e4" integer NOT NULL,
	"low_rolls_e4" bigint NOT NULL,
	"near_days_max" integer NOT NULL,
	"near_share_e4" integer NOT NULL,
	"smallest_tank_ul" bigint,
	CONSTRAINT "darkroom_settings_pk" PRIMARY KEY("darkroom_id"),
	CONSTRAINT "darkroom_settings_temperature_unit" CHECK ("temperature_unit" in ('C', 'F')),
	CONSTRAINT "darkroom_settings_volume_unit" CHECK ("volume_unit" in ('mL', 'fl oz')),
	CONSTRAINT "darkroom_settings_currency" CHECK ("darkroom_settings"."currency" ~ '^[A-Z]{3}$'),
	CONSTRAINT "darkroom_settings_thresholds" CHECK ("darkroom_settings"."low_share_e4" between 0 and 10000 and "darkroom_settings"."low_rolls_e4" >= 0 and "darkroom_settings"."near_days_max" >= 0 and "darkroom_settings"."near_share_e4" between 0 and 10000),
	CONSTRAINT "darkroom_settings_tank" CHECK ("darkroom_settings"."smallest_tank_ul" > 0)
);
--> statement-breakpoint
ALTER TABLE "darkroom_settings" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "guests" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"reach" text NOT NULL,
	CONSTRAINT "guests_pk" PRIMARY KEY("darkroom_id","id")
);
--> statement-breakpoint
ALTER TABLE "guests" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "memberships" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"person_id" uuid,
	"role" text NOT NULL,
	"display_name" text NOT NULL,
	"joined_at" timestamp with time zone NOT NULL,
	"left_at" timestamp with time zone,
	CONSTRAINT "memberships_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "memberships_person_uq" UNIQUE("darkroom_id","person_id"),
	CONSTRAINT "memberships_role" CHECK ("role" in ('member', 'technician', 'manager'))
);
--> statement-breakpoint
ALTER TABLE "memberships" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "lots" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"pack_id" uuid NOT NULL,
	"lot_number" text NOT NULL,
	"expires_on" date,
	"expiry_is_guess" boolean NOT NULL,
	"unopened" integer NOT NULL,
	CONSTRAINT "lots_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "lots_unopened" CHECK ("lots"."unopened" >= 0)
);
--> statement-breakpoint
ALTER TABLE "lots" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "makes" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"pack_id" uuid,
	"stock_chemistry_id" uuid,
	"chemistry_id" uuid NOT NULL,
	"volume_ul" bigint,
	"whole_only" boolean NOT NULL,
	CONSTRAINT "makes_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "makes_from" CHECK (num_nonnulls("makes"."pack_id", "makes"."stock_chemistry_id") = 1),
	CONSTRAINT "makes_volume" CHECK ("makes"."volume_ul" > 0 and ("makes"."pack_id" is null) = ("makes"."volume_ul" is null))
);
--> statement-breakpoint
ALTER TABLE "makes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "opened_packs" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"lot_id" uuid NOT NULL,
	"pack_part_id" uuid NOT NULL,
	"opened_on" date NOT NULL,
	"left_ul" bigint,
	"left_mg" bigint,
	"voided_at" timestamp with time zone,
	CONSTRAINT "opened_packs_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "opened_packs_left" CHECK (num_nonnulls("opened_packs"."left_ul", "opened_packs"."left_mg") = 1 and coalesce("opened_packs"."left_ul", "opened_packs"."left_mg") >= 0)
);
--> statement-breakpoint
ALTER TABLE "opened_packs" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "pack_parts" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"pack_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"name" text NOT NULL,
	"size_ul" bigint,
	"size_mg" bigint,
	"keeps_opened_months" integer,
	CONSTRAINT "pack_parts_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "pack_parts_position_uq" UNIQUE("darkroom_id","pack_id","position"),
	CONSTRAINT "pack_parts_size" CHECK (num_nonnulls("pack_parts"."size_ul", "pack_parts"."size_mg") = 1 and coalesce("pack_parts"."size_ul", "pack_parts"."size_mg") > 0)
);
--> statement-breakpoint
ALTER TABLE "pack_parts" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "packs" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"form" text NOT NULL,
	"keeps_unopened_months" integer,
	"reorder_point" integer,
	"reorder_up_to" integer,
	"archived_at" timestamp with time zone,
	CONSTRAINT "packs_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "packs_form" CHECK ("form" in ('kit', 'concentrate', 'powder', 'ready-to-use', 'raw')),
	CONSTRAINT "packs_keeps" CHECK ("packs"."keeps_unopened_months" > 0),
	CONSTRAINT "packs_reorder" CHECK ("packs"."reorder_point" >= 0 and "packs"."reorder_up_to" > "packs"."reorder_point")
);
--> statement-breakpoint
ALTER TABLE "packs" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "supplier_packs" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"supplier_id" uuid NOT NULL,
	"pack_id" uuid NOT NULL,
	"supplier_name" text NOT NULL,
	"price_minor" bigint,
	"out_until" date,
	CONSTRAINT "supplier_packs_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "supplier_packs_pair_uq" UNIQUE("darkroom_id","supplier_id","pack_id"),
	CONSTRAINT "supplier_packs_price" CHECK ("supplier_packs"."price_minor" >= 0)
);
--> statement-breakpoint
ALTER TABLE "supplier_packs" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "suppliers" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"currency" text NOT NULL,
	"minimum_minor" bigint,
	"lead_days" integer,
	"archived_at" timestamp with time zone,
	CONSTRAINT "suppliers_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "suppliers_numbers" CHECK ("suppliers"."minimum_minor" >= 0 and "suppliers"."lead_days" >= 0),
	CONSTRAINT "suppliers_currency" CHECK ("suppliers"."currency" ~ '^[A-Z]{3}$')
);
--> statement-breakpoint
ALTER TABLE "suppliers" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "events" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"kind" text NOT NULL,
	"bottle_id" uuid,
	"pack_id" uuid,
	"load_action_id" uuid,
	"subject_id" uuid GENERATED ALWAYS AS (coalesce(bottle_id, pack_id, load_action_id)) STORED NOT NULL,
	"crossing" integer NOT NULL,
	"opened_at" timestamp with time zone NOT NULL,
	"ended_at" timestamp with time zone,
	"ended_by" text,
	CONSTRAINT "events_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "events_crossing_uq" UNIQUE("darkroom_id","subject_id","kind","crossing"),
	CONSTRAINT "events_kind" CHECK ("kind" in ('low', 'near-date', 'spent', 'past-date', 'on-hold', 'load-to-decide', 'kit-near-expiry', 'kit-past-expiry', 'reorder-point', 'none-on-shelf', 'test-due')),
	CONSTRAINT "events_ended_by" CHECK ("ended_by" in ('action', 'retraction', 'time')),
	CONSTRAINT "events_subject" CHECK (num_nonnulls("events"."bottle_id", "events"."pack_id", "events"."load_action_id") = 1),
	CONSTRAINT "events_ended" CHECK (("events"."ended_at" is null) = ("events"."ended_by" is null))
);
--> statement-breakpoint
ALTER TABLE "events" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "mails" (
	"darkroom_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"kind" text NOT NULL,
	"membership_id" uuid,
	"order_id" uuid,
	"to_address" text NOT NULL,
	"reply_to" text,
	"subject" text NOT NULL,
	"body" text NOT NULL,
	"message_id" text NOT NULL,
	"dedupe_key" text NOT NULL,
	"state" text NOT NULL,
	"due_at" timestamp with time zone NOT NULL,
	"attempts" integer NOT NULL,
	"lease_until" timestamp with time zone,
	"lease_id" uuid,
	"last_answer" text,
	"created_at" timestamp with time zone NOT NULL,
	"sent_at" timestamp with time zone,
	"withdrawn_because" text,
	CONSTRAINT "mails_pk" PRIMARY KEY("darkroom_id","id"),
	CONSTRAINT "mails_dedupe_uq" UNIQUE("darkroom_id","dedupe_key"),
	CONSTRAINT "mails_kind" CHECK ("kind" in ('warning', 'order', 'order-cancelled')),
	CONSTRAINT "mails_state" CHECK ("state" in ('waiting', 'leased', 'sent', 'failed', 'withdrawn')),
	CONSTRAINT "mails_lease" CHECK (("mails"."state" = 'leased') = ("mails"."lease_until" is not null and "mails"."lease_id" is not null))
);
--> statement-breakpoint
ALTER TABLE "mails" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "notices" (
	"darkroom_id" uuid NOT NULL,
	"event_id" uuid NOT NULL,
	"membership_id" uuid NOT NULL,
	"mail_id" uuid NOT NULL,
	CONSTRAINT "notices_pk" PRIMARY KEY("darkroom_id","event_id","membership_id")
);
--> statement-breakpoint
ALTER TABLE "notices" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "actions" ADD CONSTRAINT "actions_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "actions" ADD CONSTRAINT "actions_membership_fk" FOREIGN KEY ("darkroom_id","membership_id") REFERENCES "public"."memberships"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "setting_changes" ADD CONSTRAINT "setting_changes_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "setting_changes" ADD CONSTRAINT "setting_changes_action_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."actions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "voids" ADD CONSTRAINT "voids_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "voids" ADD CONSTRAINT "voids_action_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."actions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "voids" ADD CONSTRAINT "voids_voided_fk" FOREIGN KEY ("darkroom_id","voided_action_id") REFERENCES "public"."actions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bottle_totals" ADD CONSTRAINT "bottle_totals_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bottle_totals" ADD CONSTRAINT "bottle_totals_bottle_fk" FOREIGN KEY ("darkroom_id","bottle_id") REFERENCES "public"."bottles"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bottles" ADD CONSTRAINT "bottles_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bottles" ADD CONSTRAINT "bottles_version_fk" FOREIGN KEY ("darkroom_id","chemistry_version_id") REFERENCES "public"."chemistry_versions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bottles" ADD CONSTRAINT "bottles_action_fk" FOREIGN KEY ("darkroom_id","made_by_action_id") REFERENCES "public"."actions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "counters" ADD CONSTRAINT "counters_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "chemistries" ADD CONSTRAINT "chemistries_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "chemistry_versions" ADD CONSTRAINT "chemistry_versions_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "chemistry_versions" ADD CONSTRAINT "chemistry_versions_chemistry_fk" FOREIGN KEY ("darkroom_id","chemistry_id") REFERENCES "public"."chemistries"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "chemistry_versions" ADD CONSTRAINT "chemistry_versions_created_by_fk" FOREIGN KEY ("darkroom_id","created_by") REFERENCES "public"."memberships"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "discards" ADD CONSTRAINT "discards_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "discards" ADD CONSTRAINT "discards_action_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."actions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "discards" ADD CONSTRAINT "discards_bottle_fk" FOREIGN KEY ("darkroom_id","bottle_id") REFERENCES "public"."bottles"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "holds" ADD CONSTRAINT "holds_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "holds" ADD CONSTRAINT "holds_action_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."actions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "holds" ADD CONSTRAINT "holds_bottle_fk" FOREIGN KEY ("darkroom_id","bottle_id") REFERENCES "public"."bottles"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "identity"."credentials" ADD CONSTRAINT "credentials_person" FOREIGN KEY ("person_id") REFERENCES "identity"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "identity"."one_time_codes" ADD CONSTRAINT "one_time_codes_person" FOREIGN KEY ("person_id") REFERENCES "identity"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "identity"."refresh_tokens" ADD CONSTRAINT "refresh_tokens_session" FOREIGN KEY ("session_id") REFERENCES "identity"."sessions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "identity"."sessions" ADD CONSTRAINT "sessions_person" FOREIGN KEY ("person_id") REFERENCES "identity"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "line_steps" ADD CONSTRAINT "line_steps_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "line_steps" ADD CONSTRAINT "line_steps_version_fk" FOREIGN KEY ("darkroom_id","line_version_id") REFERENCES "public"."line_versions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "line_steps" ADD CONSTRAINT "line_steps_step_fk" FOREIGN KEY ("darkroom_id","step_id") REFERENCES "public"."steps"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "line_versions" ADD CONSTRAINT "line_versions_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "line_versions" ADD CONSTRAINT "line_versions_line_fk" FOREIGN KEY ("darkroom_id","line_id") REFERENCES "public"."lines"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lines" ADD CONSTRAINT "lines_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "placement_changes" ADD CONSTRAINT "placement_changes_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "placement_changes" ADD CONSTRAINT "placement_changes_action_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."actions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "placement_changes" ADD CONSTRAINT "placement_changes_step_fk" FOREIGN KEY ("darkroom_id","step_id") REFERENCES "public"."steps"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "placement_changes" ADD CONSTRAINT "placement_changes_bottle_fk" FOREIGN KEY ("darkroom_id","bottle_id") REFERENCES "public"."bottles"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "placements" ADD CONSTRAINT "placements_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "placements" ADD CONSTRAINT "placements_step_fk" FOREIGN KEY ("darkroom_id","step_id") REFERENCES "public"."steps"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "placements" ADD CONSTRAINT "placements_bottle_fk" FOREIGN KEY ("darkroom_id","bottle_id") REFERENCES "public"."bottles"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "steps" ADD CONSTRAINT "steps_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "steps" ADD CONSTRAINT "steps_line_fk" FOREIGN KEY ("darkroom_id","line_id") REFERENCES "public"."lines"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "decisions" ADD CONSTRAINT "decisions_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "decisions" ADD CONSTRAINT "decisions_action_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."actions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "decisions" ADD CONSTRAINT "decisions_load_fk" FOREIGN KEY ("darkroom_id","load_action_id") REFERENCES "public"."loads"("darkroom_id","action_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "load_film" ADD CONSTRAINT "load_film_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "load_film" ADD CONSTRAINT "load_film_load_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."loads"("darkroom_id","action_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "load_film" ADD CONSTRAINT "load_film_membership_fk" FOREIGN KEY ("darkroom_id","owner_membership_id") REFERENCES "public"."memberships"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "load_film" ADD CONSTRAINT "load_film_guest_fk" FOREIGN KEY ("darkroom_id","owner_guest_id") REFERENCES "public"."guests"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "load_steps" ADD CONSTRAINT "load_steps_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "load_steps" ADD CONSTRAINT "load_steps_load_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."loads"("darkroom_id","action_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "load_steps" ADD CONSTRAINT "load_steps_bottle_fk" FOREIGN KEY ("darkroom_id","bottle_id") REFERENCES "public"."bottles"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "loads" ADD CONSTRAINT "loads_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "loads" ADD CONSTRAINT "loads_action_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."actions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "loads" ADD CONSTRAINT "loads_line_version_fk" FOREIGN KEY ("darkroom_id","line_version_id") REFERENCES "public"."line_versions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mix_draws" ADD CONSTRAINT "mix_draws_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mix_draws" ADD CONSTRAINT "mix_draws_mix_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."mixes"("darkroom_id","action_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mix_draws" ADD CONSTRAINT "mix_draws_lot_fk" FOREIGN KEY ("darkroom_id","lot_id") REFERENCES "public"."lots"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mix_draws" ADD CONSTRAINT "mix_draws_part_fk" FOREIGN KEY ("darkroom_id","pack_part_id") REFERENCES "public"."pack_parts"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mix_draws" ADD CONSTRAINT "mix_draws_opened_fk" FOREIGN KEY ("darkroom_id","opened_pack_id") REFERENCES "public"."opened_packs"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mix_draws" ADD CONSTRAINT "mix_draws_parent_fk" FOREIGN KEY ("darkroom_id","parent_bottle_id") REFERENCES "public"."bottles"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mixes" ADD CONSTRAINT "mixes_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mixes" ADD CONSTRAINT "mixes_action_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."actions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mixes" ADD CONSTRAINT "mixes_bottle_fk" FOREIGN KEY ("darkroom_id","bottle_id") REFERENCES "public"."bottles"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "deliveries" ADD CONSTRAINT "deliveries_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "deliveries" ADD CONSTRAINT "deliveries_action_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."actions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "deliveries" ADD CONSTRAINT "deliveries_order_fk" FOREIGN KEY ("darkroom_id","order_id") REFERENCES "public"."orders"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "delivery_lines" ADD CONSTRAINT "delivery_lines_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "delivery_lines" ADD CONSTRAINT "delivery_lines_delivery_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."deliveries"("darkroom_id","action_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "delivery_lines" ADD CONSTRAINT "delivery_lines_order_line_fk" FOREIGN KEY ("darkroom_id","order_line_id") REFERENCES "public"."order_lines"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "delivery_lines" ADD CONSTRAINT "delivery_lines_lot_fk" FOREIGN KEY ("darkroom_id","lot_id") REFERENCES "public"."lots"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "order_changes" ADD CONSTRAINT "order_changes_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "order_changes" ADD CONSTRAINT "order_changes_action_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."actions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "order_changes" ADD CONSTRAINT "order_changes_order_fk" FOREIGN KEY ("darkroom_id","order_id") REFERENCES "public"."orders"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "order_lines" ADD CONSTRAINT "order_lines_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "order_lines" ADD CONSTRAINT "order_lines_order_fk" FOREIGN KEY ("darkroom_id","order_id") REFERENCES "public"."orders"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "order_lines" ADD CONSTRAINT "order_lines_pack_fk" FOREIGN KEY ("darkroom_id","supplier_pack_id") REFERENCES "public"."supplier_packs"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "orders" ADD CONSTRAINT "orders_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "orders" ADD CONSTRAINT "orders_supplier_fk" FOREIGN KEY ("darkroom_id","supplier_id") REFERENCES "public"."suppliers"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "orders" ADD CONSTRAINT "orders_drafted_by_fk" FOREIGN KEY ("darkroom_id","drafted_by") REFERENCES "public"."memberships"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "orders" ADD CONSTRAINT "orders_sent_by_fk" FOREIGN KEY ("darkroom_id","sent_by") REFERENCES "public"."memberships"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stock_movements" ADD CONSTRAINT "stock_movements_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stock_movements" ADD CONSTRAINT "stock_movements_action_fk" FOREIGN KEY ("darkroom_id","action_id") REFERENCES "public"."actions"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stock_movements" ADD CONSTRAINT "stock_movements_pack_fk" FOREIGN KEY ("darkroom_id","pack_id") REFERENCES "public"."packs"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stock_movements" ADD CONSTRAINT "stock_movements_lot_fk" FOREIGN KEY ("darkroom_id","lot_id") REFERENCES "public"."lots"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stock_movements" ADD CONSTRAINT "stock_movements_opened_fk" FOREIGN KEY ("darkroom_id","opened_pack_id") REFERENCES "public"."opened_packs"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "darkroom_settings" ADD CONSTRAINT "darkroom_settings_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "guests" ADD CONSTRAINT "guests_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "identity"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lots" ADD CONSTRAINT "lots_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lots" ADD CONSTRAINT "lots_pack_fk" FOREIGN KEY ("darkroom_id","pack_id") REFERENCES "public"."packs"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "makes" ADD CONSTRAINT "makes_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "makes" ADD CONSTRAINT "makes_pack_fk" FOREIGN KEY ("darkroom_id","pack_id") REFERENCES "public"."packs"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "makes" ADD CONSTRAINT "makes_stock_chemistry_fk" FOREIGN KEY ("darkroom_id","stock_chemistry_id") REFERENCES "public"."chemistries"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "makes" ADD CONSTRAINT "makes_chemistry_fk" FOREIGN KEY ("darkroom_id","chemistry_id") REFERENCES "public"."chemistries"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "opened_packs" ADD CONSTRAINT "opened_packs_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "opened_packs" ADD CONSTRAINT "opened_packs_lot_fk" FOREIGN KEY ("darkroom_id","lot_id") REFERENCES "public"."lots"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "opened_packs" ADD CONSTRAINT "opened_packs_part_fk" FOREIGN KEY ("darkroom_id","pack_part_id") REFERENCES "public"."pack_parts"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pack_parts" ADD CONSTRAINT "pack_parts_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pack_parts" ADD CONSTRAINT "pack_parts_pack_fk" FOREIGN KEY ("darkroom_id","pack_id") REFERENCES "public"."packs"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "packs" ADD CONSTRAINT "packs_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "supplier_packs" ADD CONSTRAINT "supplier_packs_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "supplier_packs" ADD CONSTRAINT "supplier_packs_supplier_fk" FOREIGN KEY ("darkroom_id","supplier_id") REFERENCES "public"."suppliers"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "supplier_packs" ADD CONSTRAINT "supplier_packs_pack_fk" FOREIGN KEY ("darkroom_id","pack_id") REFERENCES "public"."packs"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "suppliers" ADD CONSTRAINT "suppliers_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "events" ADD CONSTRAINT "events_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "events" ADD CONSTRAINT "events_bottle_fk" FOREIGN KEY ("darkroom_id","bottle_id") REFERENCES "public"."bottles"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "events" ADD CONSTRAINT "events_pack_fk" FOREIGN KEY ("darkroom_id","pack_id") REFERENCES "public"."packs"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "events" ADD CONSTRAINT "events_load_fk" FOREIGN KEY ("darkroom_id","load_action_id") REFERENCES "public"."loads"("darkroom_id","action_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mails" ADD CONSTRAINT "mails_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mails" ADD CONSTRAINT "mails_membership_fk" FOREIGN KEY ("darkroom_id","membership_id") REFERENCES "public"."memberships"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mails" ADD CONSTRAINT "mails_order_fk" FOREIGN KEY ("darkroom_id","order_id") REFERENCES "public"."orders"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notices" ADD CONSTRAINT "notices_darkroom_id_darkrooms_id_fk" FOREIGN KEY ("darkroom_id") REFERENCES "identity"."darkrooms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notices" ADD CONSTRAINT "notices_event_fk" FOREIGN KEY ("darkroom_id","event_id") REFERENCES "public"."events"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notices" ADD CONSTRAINT "notices_membership_fk" FOREIGN KEY ("darkroom_id","membership_id") REFERENCES "public"."memberships"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notices" ADD CONSTRAINT "notices_mail_fk" FOREIGN KEY ("darkroom_id","mail_id") REFERENCES "public"."mails"("darkroom_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "actions_newest" ON "actions" USING btree ("darkroom_id","happened_at" DESC NULLS LAST,"seq" DESC NULLS LAST);--> statement-breakpoint
CREATE INDEX "actions_by_membership" ON "actions" USING btree ("darkroom_id","membership_id","seq" DESC NULLS LAST);--> statement-breakpoint
CREATE INDEX "bottle_totals_in_use" ON "bottle_totals" USING btree ("darkroom_id","bottle_id") WHERE in_use;--> statement-breakpoint
CREATE INDEX "bottle_totals_next_look" ON "bottle_totals" USING btree ("darkroom_id","next_look_at") WHERE next_look_at is not null;--> statement-breakpoint
CREATE INDEX "bottles_by_action" ON "bottles" USING btree ("darkroom_id","made_by_action_id");--> statement-breakpoint
CREATE INDEX "discards_by_bottle" ON "discards" USING btree ("darkroom_id","bottle_id");--> statement-breakpoint
CREATE INDEX "holds_by_bottle" ON "holds" USING btree ("darkroom_id","bottle_id");--> statement-breakpoint
CREATE INDEX "darkrooms_next_check" ON "identity"."darkrooms" USING btree ("next_check_at");--> statement-breakpoint
CREATE INDEX "refresh_tokens_by_session" ON "identity"."refresh_tokens" USING btree ("session_id");--> statement-breakpoint
CREATE INDEX "sessions_by_person" ON "identity"."sessions" USING btree ("person_id");--> statement-breakpoint
CREATE UNIQUE INDEX "placements_now_uq" ON "placements" USING btree ("darkroom_id","step_id") WHERE to_at is null;--> statement-breakpoint
CREATE INDEX "placements_by_bottle" ON "placements" USING btree ("darkroom_id","bottle_id");--> statement-breakpoint
CREATE INDEX "load_film_by_membership" ON "load_film" USING btree ("darkroom_id","owner_membership_id");--> statement-breakpoint
CREATE INDEX "load_steps_by_bottle" ON "load_steps" USING btree ("darkroom_id","bottle_id","action_id");--> statement-breakpoint
CREATE INDEX "mix_draws_by_parent" ON "mix_draws" USING btree ("darkroom_id","parent_bottle_id");--> statement-breakpoint
CREATE INDEX "mixes_by_bottle" ON "mixes" USING btree ("darkroom_id","bottle_id");--> statement-breakpoint
CREATE INDEX "deliveries_by_order" ON "deliveries" USING btree ("darkroom_id","order_id");--> statement-breakpoint
CREATE INDEX "delivery_lines_by_lot" ON "delivery_lines" USING btree ("darkroom_id","lot_id");--> statement-breakpoint
CREATE INDEX "orders_by_state" ON "orders" USING btree ("darkroom_id","state","number");--> statement-breakpoint
CREATE INDEX "stock_movements_by_lot" ON "stock_movements" USING btree ("darkroom_id","lot_id");--> statement-breakpoint
CREATE INDEX "stock_movements_by_opened" ON "stock_movements" USING btree ("darkroom_id","opened_pack_id");--> statement-breakpoint
CREATE INDEX "memberships_by_person" ON "memberships" USING btree ("person_id");--> statement-breakpoint
CREATE INDEX "lots_by_pack" ON "lots" USING btree ("darkroom_id","pack_id","id");--> statement-breakpoint
CREATE INDEX "opened_packs_by_lot" ON "opened_packs" USING btree ("darkroom_id","lot_id","id");--> statement-breakpoint
CREATE INDEX "events_open" ON "events" USING btree ("darkroom_id","opened_at") WHERE ended_at is null;--> statement-breakpoint
CREATE INDEX "mails_due" ON "mails" USING btree ("darkroom_id","due_at") WHERE state in ('waiting', 'leased');--> statement-breakpoint
CREATE INDEX "notices_by_mail" ON "notices" USING btree ("darkroom_id","mail_id");--> statement-breakpoint
CREATE POLICY "actions_own_darkroom" ON "actions" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "setting_changes_own_darkroom" ON "setting_changes" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "voids_own_darkroom" ON "voids" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "bottle_totals_own_darkroom" ON "bottle_totals" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "bottles_own_darkroom" ON "bottles" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "counters_own_darkroom" ON "counters" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "chemistries_own_darkroom" ON "chemistries" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "chemistry_versions_own_darkroom" ON "chemistry_versions" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "discards_own_darkroom" ON "discards" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "holds_own_darkroom" ON "holds" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "line_steps_own_darkroom" ON "line_steps" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "line_versions_own_darkroom" ON "line_versions" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "lines_own_darkroom" ON "lines" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "placement_changes_own_darkroom" ON "placement_changes" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "placements_own_darkroom" ON "placements" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "steps_own_darkroom" ON "steps" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "decisions_own_darkroom" ON "decisions" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "load_film_own_darkroom" ON "load_film" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "load_steps_own_darkroom" ON "load_steps" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "loads_own_darkroom" ON "loads" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "mix_draws_own_darkroom" ON "mix_draws" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "mixes_own_darkroom" ON "mixes" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "deliveries_own_darkroom" ON "deliveries" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "delivery_lines_own_darkroom" ON "delivery_lines" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "order_changes_own_darkroom" ON "order_changes" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "order_lines_own_darkroom" ON "order_lines" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "orders_own_darkroom" ON "orders" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "stock_movements_own_darkroom" ON "stock_movements" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "darkroom_settings_own_darkroom" ON "darkroom_settings" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "guests_own_darkroom" ON "guests" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "memberships_own_darkroom" ON "memberships" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "memberships_own_person" ON "memberships" AS PERMISSIVE FOR SELECT TO public USING (person_id = nullif(current_setting('app.person', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "lots_own_darkroom" ON "lots" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "makes_own_darkroom" ON "makes" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "opened_packs_own_darkroom" ON "opened_packs" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "pack_parts_own_darkroom" ON "pack_parts" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "packs_own_darkroom" ON "packs" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "supplier_packs_own_darkroom" ON "supplier_packs" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "suppliers_own_darkroom" ON "suppliers" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "events_own_darkroom" ON "events" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "mails_own_darkroom" ON "mails" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "notices_own_darkroom" ON "notices" AS PERMISSIVE FOR ALL TO public USING (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid) WITH CHECK (darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid);