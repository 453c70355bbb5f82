import type { MigrationInterface, QueryRunner } from 'typeorm';

export class FirstSchema1796127050254 implements MigrationInterface {
  name = 'FirstSchema1796127050254';

  public async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(
      `CREATE TABLE "account" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "email" text NOT NULL, "display_name" text NOT NULL, "password_hash" text NOT NULL, "totp_secret" text, "totp_confirmed_at" TIMESTAMP WITH TIME ZONE, "totp_last_step" bigint, "is_steward" boolean NOT NULL DEFAULT false, "preferred_unit" text NOT NULL DEFAULT 'mm', "time_zone" text NOT NULL DEFAULT 'UTC', "bench_seen_at" TIMESTAMP WITH TIME ZONE, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "PK_54115ee388cdb6d86bb4bf5b2ea" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE UNIQUE INDEX "account_email_key" ON "account"  ("email") `);
    await queryRunner.query(
      `CREATE TABLE "commission" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "code" text NOT NULL, "title" text NOT NULL, "brief" text NOT NULL DEFAULT '', "state" text NOT NULL DEFAULT 'in-brief', "date_wanted" date, "budget_minor" integer, "currency" text NOT NULL DEFAULT 'EUR', "cover_file_id" uuid, "member_keys" uuid array NOT NULL DEFAULT '{}', "lead_name" text NOT NULL DEFAULT '', "client_name" text, "told_from_day" date, "told_to_day" date, "delivered_on" date, "revision" integer NOT NULL DEFAULT '1', "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), "updated_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "commission_state_known" CHECK ("state" IN ('in-brief', 'at-work', 'delivered', 'ended')), CONSTRAINT "PK_d108d70411783e2a3a84e386601" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE UNIQUE INDEX "commission_code_key" ON "commission"  ("code") `);
    await queryRunner.query(`CREATE INDEX "commission_member_keys_idx" ON "commission" USING gin ("member_keys") `);
    await queryRunner.query(`CREATE INDEX "commission_latest_idx" ON "commission"  ("updated_at", "id") `);
    await queryRunner.query(
      `CREATE TABLE "shop" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "name" text NOT NULL, "craft" text NOT NULL DEFAULT '', "country" text NOT NULL, "time_zone" text NOT NULL DEFAULT 'UTC', "tint" text NOT NULL DEFAULT 'verdigris', "revision" integer NOT NULL DEFAULT '1', "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "PK_ad47b7c6121fe31cb4b05438e44" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(
      `CREATE TABLE "party" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "commission_id" uuid NOT NULL, "roles" text array NOT NULL, "shop_id" uuid, "account_id" uuid, "guest_sees" text array NOT NULL DEFAULT '{}', "sees_until" date, "joined_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), "left_at" TIMESTAMP WITH TIME ZONE, CONSTRAINT "party_is_shop_or_person" CHECK (("shop_id" IS NULL) <> ("account_id" IS NULL)), CONSTRAINT "PK_e6189b3d533e140bb33a6d2cec1" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE INDEX "party_shop_idx" ON "party"  ("shop_id") `);
    await queryRunner.query(`CREATE INDEX "party_account_idx" ON "party"  ("account_id") `);
    await queryRunner.query(
      `CREATE UNIQUE INDEX "party_commission_account_key" ON "party"  ("commission_id", "account_id") WHERE "left_at" IS NULL AND "account_id" IS NOT NULL`,
    );
    await queryRunner.query(
      `CREATE UNIQUE INDEX "party_commission_shop_key" ON "party"  ("commission_id", "shop_id") WHERE "left_at" IS NULL AND "shop_id" IS NOT NULL`,
    );
    await queryRunner.query(
      `CREATE TABLE "part" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "commission_id" uuid NOT NULL, "name" text NOT NULL, "kind" text NOT NULL, "holder_party_id" uuid NOT NULL, "holder_since" date NOT NULL DEFAULT ('now'::text)::date, "position" integer NOT NULL DEFAULT '0', "revision" integer NOT NULL DEFAULT '1', CONSTRAINT "PK_58888debdf048d2dfe459aa59da" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE INDEX "part_commission_idx" ON "part"  ("commission_id") `);
    await queryRunner.query(
      `CREATE TABLE "joint" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "commission_id" uuid NOT NULL, "name" text NOT NULL, "kind" text NOT NULL, "hole_part_id" uuid NOT NULL, "shaft_part_id" uuid NOT NULL, "hole_party_id" uuid NOT NULL, "shaft_party_id" uuid NOT NULL, "nominal_mm" double precision NOT NULL, "clearance_min_um" double precision NOT NULL, "clearance_max_um" double precision NOT NULL, "hole_class" text, "shaft_class" text, "hand_fit" text, "engagement_mm" double precision, "hidden_length_mm" double precision, "note" text NOT NULL DEFAULT '', "revision" integer NOT NULL DEFAULT '1', CONSTRAINT "joint_between_two_parts" CHECK ("hole_part_id" <> "shaft_part_id"), CONSTRAINT "joint_range_in_order" CHECK ("clearance_min_um" <= "clearance_max_um"), CONSTRAINT "PK_a242418e5bb3844b3a7b4a9513d" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE INDEX "joint_commission_idx" ON "joint"  ("commission_id") `);
    await queryRunner.query(
      `CREATE TABLE "leg" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "commission_id" uuid NOT NULL, "party_id" uuid NOT NULL, "part_id" uuid NOT NULL, "kind" text NOT NULL, "title" text NOT NULL, "state" text NOT NULL DEFAULT 'planned', "hopeful_days" double precision NOT NULL, "likely_days" double precision NOT NULL, "bad_days" double precision NOT NULL, "planned_start_on" date, "started_on" date, "finished_on" date, "private_note" text NOT NULL DEFAULT '', "position" integer NOT NULL DEFAULT '0', "revision" integer NOT NULL DEFAULT '1', CONSTRAINT "leg_days_follow_state" CHECK (("state" <> 'finished' OR "finished_on" IS NOT NULL) AND ("state" = 'planned' OR "state" = 'dropped' OR "started_on" IS NOT NULL)), CONSTRAINT "leg_estimates_in_order" CHECK ("hopeful_days" <= "likely_days" AND "likely_days" <= "bad_days" AND "hopeful_days" >= 0), CONSTRAINT "leg_state_known" CHECK ("state" IN ('planned', 'under-way', 'finished', 'dropped')), CONSTRAINT "PK_3d5807243e6c648621279e9f098" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE INDEX "leg_commission_idx" ON "leg"  ("commission_id") `);
    await queryRunner.query(`CREATE INDEX "leg_party_idx" ON "leg"  ("party_id") `);
    await queryRunner.query(
      `CREATE TABLE "fit_report" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "commission_id" uuid NOT NULL, "joint_id" uuid NOT NULL, "title" text NOT NULL, "plain_words" text NOT NULL DEFAULT '', "state" text NOT NULL DEFAULT 'raised', "blocking" boolean NOT NULL, "held_leg_id" uuid, "raised_by_party_id" uuid NOT NULL, "raised_by_account_id" uuid NOT NULL, "answer_party_id" uuid NOT NULL, "client_words" text NOT NULL DEFAULT '', "reopened_count" integer NOT NULL DEFAULT '0', "raised_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), "revision" integer NOT NULL DEFAULT '1', CONSTRAINT "fit_report_state_known" CHECK ("state" IN ('raised', 'answered', 'agreed', 'being-reworked', 'to-be-verified', 'closed', 'withdrawn')), CONSTRAINT "PK_16c7421d7bc38983779ffafda6e" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE INDEX "fit_report_commission_idx" ON "fit_report"  ("commission_id") `);
    await queryRunner.query(`CREATE INDEX "fit_report_held_leg_idx" ON "fit_report"  ("held_leg_id") `);
    await queryRunner.query(
      `CREATE UNIQUE INDEX "fit_report_open_on_joint_key" ON "fit_report"  ("joint_id") WHERE "state" IN ('raised', 'answered', 'agreed', 'being-reworked', 'to-be-verified')`,
    );
    await queryRunner.query(
      `CREATE TABLE "handoff" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "commission_id" uuid NOT NULL, "from_party_id" uuid NOT NULL, "to_party_id" uuid NOT NULL, "part_ids" uuid array NOT NULL, "from_leg_id" uuid, "to_leg_id" uuid, "transit_days" double precision NOT NULL DEFAULT '1', "carriage" text NOT NULL DEFAULT '', "agreed_on" date, "done_on" date, "revision" integer NOT NULL DEFAULT '1', CONSTRAINT "handoff_between_two_parties" CHECK ("from_party_id" <> "to_party_id"), CONSTRAINT "PK_036052d138cc8c887e20ce4e1dd" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE INDEX "handoff_commission_idx" ON "handoff"  ("commission_id") `);
    await queryRunner.query(`CREATE INDEX "handoff_from_idx" ON "handoff"  ("from_party_id") `);
    await queryRunner.query(`CREATE INDEX "handoff_to_idx" ON "handoff"  ("to_party_id") `);
    await queryRunner.query(
      `CREATE TABLE "handoff_offer" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "handoff_id" uuid NOT NULL, "by_party_id" uuid NOT NULL, "by_account_id" uuid NOT NULL, "on_day" date NOT NULL, "words" text NOT NULL DEFAULT '', "state" text NOT NULL DEFAULT 'standing', "answered_by_account_id" uuid, "answered_at" TIMESTAMP WITH TIME ZONE, "reason" text NOT NULL DEFAULT '', "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "handoff_offer_state_known" CHECK ("state" IN ('standing', 'accepted', 'countered', 'declined', 'withdrawn')), CONSTRAINT "PK_c0a308f98ba7b2f6e0a7ecaef1f" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(
      `CREATE UNIQUE INDEX "handoff_offer_one_standing_key" ON "handoff_offer"  ("handoff_id") WHERE "state" = 'standing'`,
    );
    await queryRunner.query(
      `CREATE INDEX "handoff_offer_handoff_idx" ON "handoff_offer"  ("handoff_id", "created_at") `,
    );
    await queryRunner.query(
      `CREATE TABLE "history_line" ("id" BIGSERIAL NOT NULL, "commission_id" uuid NOT NULL, "account_id" uuid, "subject" text NOT NULL, "subject_id" uuid NOT NULL, "words" text NOT NULL, "party_ids" uuid array, "client_may_read" boolean NOT NULL DEFAULT false, "at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "PK_d64b2d2087a886ae30361656683" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE INDEX "history_line_commission_idx" ON "history_line"  ("commission_id", "id") `);
    await queryRunner.query(
      `CREATE TABLE "idempotency_key" ("account_id" uuid NOT NULL, "key" text NOT NULL, "request_hash" text NOT NULL, "status" integer, "response" jsonb, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "PK_8212a8883c2324211e557447899" PRIMARY KEY ("account_id", "key"))`,
    );
    await queryRunner.query(`CREATE INDEX "idempotency_key_age_idx" ON "idempotency_key"  ("created_at") `);
    await queryRunner.query(
      `CREATE TABLE "invitation" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "email" text NOT NULL, "token_hash" text NOT NULL, "commission_id" uuid, "roles" text array NOT NULL DEFAULT '{}', "guest_sees" text array NOT NULL DEFAULT '{}', "sees_until" date, "shop_id" uuid, "shop_role" text, "invited_by_account_id" uuid NOT NULL, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), "expires_at" TIMESTAMP WITH TIME ZONE NOT NULL, "accepted_at" TIMESTAMP WITH TIME ZONE, "withdrawn_at" TIMESTAMP WITH TIME ZONE, CONSTRAINT "invitation_has_one_target" CHECK (("commission_id" IS NULL) <> ("shop_id" IS NULL)), CONSTRAINT "PK_beb994737756c0f18a1c1f8669c" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE UNIQUE INDEX "invitation_token_key" ON "invitation"  ("token_hash") `);
    await queryRunner.query(`CREATE INDEX "invitation_commission_idx" ON "invitation"  ("commission_id") `);
    await queryRunner.query(`CREATE INDEX "invitation_shop_idx" ON "invitation"  ("shop_id") `);
    await queryRunner.query(
      `CREATE TABLE "leg_order" ("leg_id" uuid NOT NULL, "after_leg_id" uuid NOT NULL, CONSTRAINT "leg_order_not_itself" CHECK ("leg_id" <> "after_leg_id"), CONSTRAINT "PK_3ef3d41c20437a1a49200059e95" PRIMARY KEY ("leg_id", "after_leg_id"))`,
    );
    await queryRunner.query(`CREATE INDEX "leg_order_after_idx" ON "leg_order"  ("after_leg_id") `);
    await queryRunner.query(
      `CREATE TABLE "thread" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "commission_id" uuid NOT NULL, "subject" text NOT NULL, "subject_id" uuid NOT NULL, "title" text NOT NULL, "audience" text NOT NULL, "party_ids" uuid array NOT NULL DEFAULT '{}', "last_sequence" integer NOT NULL DEFAULT '0', "last_message_at" TIMESTAMP WITH TIME ZONE, "opened_by_party_id" uuid NOT NULL, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "thread_named_parties" CHECK (("audience" IN ('own-shop', 'named')) = (cardinality("party_ids") > 0)), CONSTRAINT "thread_subject_known" CHECK ("subject" IN ('commission', 'leg', 'joint', 'report', 'handoff')), CONSTRAINT "thread_audience_known" CHECK ("audience" IN ('own-shop', 'named', 'makers', 'everyone')), CONSTRAINT "PK_cabc0f3f27d7b1c70cf64623e02" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(
      `CREATE INDEX "thread_subject_idx" ON "thread"  ("commission_id", "subject", "subject_id") `,
    );
    await queryRunner.query(
      `CREATE TABLE "message" ("thread_id" uuid NOT NULL, "sequence" integer NOT NULL, "id" uuid NOT NULL, "author_account_id" uuid NOT NULL, "author_party_id" uuid NOT NULL, "body" text NOT NULL, "mentioned_account_ids" uuid array NOT NULL DEFAULT '{}', "file_ids" uuid array NOT NULL DEFAULT '{}', "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "PK_5082f3212ebcdbebbedee91e175" PRIMARY KEY ("thread_id", "sequence"))`,
    );
    await queryRunner.query(
      `CREATE UNIQUE INDEX "message_author_client_id_key" ON "message"  ("author_account_id", "id") `,
    );
    await queryRunner.query(
      `CREATE TABLE "outbox_message" ("id" BIGSERIAL NOT NULL, "topic" text NOT NULL, "payload" jsonb NOT NULL, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), "leased_until" TIMESTAMP WITH TIME ZONE, "sent_at" TIMESTAMP WITH TIME ZONE, "attempts" integer NOT NULL DEFAULT '0', CONSTRAINT "PK_2f36ee5236f2793f3e7bd554589" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(
      `CREATE INDEX "outbox_message_unsent_idx" ON "outbox_message"  ("id") WHERE "sent_at" IS NULL`,
    );
    await queryRunner.query(
      `CREATE TABLE "password_reset" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "account_id" uuid NOT NULL, "token_hash" text NOT NULL, "expires_at" TIMESTAMP WITH TIME ZONE NOT NULL, "used_at" TIMESTAMP WITH TIME ZONE, CONSTRAINT "PK_8515e60a2cc41584fa4784f52ce" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE INDEX "password_reset_account_idx" ON "password_reset"  ("account_id") `);
    await queryRunner.query(`CREATE UNIQUE INDEX "password_reset_token_key" ON "password_reset"  ("token_hash") `);
    await queryRunner.query(
      `CREATE TABLE "rate_limit" ("key" character varying(255) NOT NULL, "points" integer NOT NULL DEFAULT '0', "expire" bigint, CONSTRAINT "PK_e6c0c0608decdf78e4d4b263397" PRIMARY KEY ("key"))`,
    );
    await queryRunner.query(`CREATE INDEX "rate_limit_expire_idx" ON "rate_limit"  ("expire") `);
    await queryRunner.query(
      `CREATE TABLE "reading" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "joint_id" uuid NOT NULL, "report_id" uuid, "side" text NOT NULL, "set_number" integer NOT NULL, "position" integer NOT NULL, "value_mm" double precision NOT NULL, "entered_text" text NOT NULL, "entered_unit" text NOT NULL, "resolution_um" double precision NOT NULL, "station_mm" double precision, "angle_deg" double precision, "temperature_c" double precision, "humidity_pct" double precision, "gauge" text, "party_id" uuid NOT NULL, "account_id" uuid NOT NULL, "taken_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "reading_positive" CHECK ("value_mm" > 0 AND "resolution_um" > 0), CONSTRAINT "reading_side_known" CHECK ("side" IN ('hole', 'shaft')), CONSTRAINT "PK_f46a902bd4c9624c8b512174944" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE INDEX "reading_joint_set_idx" ON "reading"  ("joint_id", "side", "set_number") `);
    await queryRunner.query(
      `CREATE TABLE "recovery_code" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "account_id" uuid NOT NULL, "code_hash" text NOT NULL, "used_at" TIMESTAMP WITH TIME ZONE, CONSTRAINT "PK_b7f1e23329e93a80e25fd281922" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE INDEX "recovery_code_account_idx" ON "recovery_code"  ("account_id") `);
    await queryRunner.query(
      `CREATE TABLE "report_event" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "report_id" uuid NOT NULL, "act" text NOT NULL, "from_state" text, "to_state" text NOT NULL, "account_id" uuid NOT NULL, "words" text NOT NULL DEFAULT '', "at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "PK_247b406f3221ad7b2c4b4f09933" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE INDEX "report_event_report_idx" ON "report_event"  ("report_id", "at") `);
    await queryRunner.query(
      `CREATE TABLE "rework_note" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "report_id" uuid NOT NULL, "party_id" uuid NOT NULL, "account_id" uuid NOT NULL, "state" text NOT NULL DEFAULT 'offered', "method" text NOT NULL, "cut_side" text NOT NULL, "remove_on_diameter_um" double precision NOT NULL, "over_length_mm" double precision, "risk" text NOT NULL DEFAULT '', "shows" boolean NOT NULL, "where_it_shows" text NOT NULL DEFAULT '', "cost_minor" integer NOT NULL DEFAULT '0', "currency" text NOT NULL DEFAULT 'EUR', "cost_borne_by_party_id" uuid, "effect_days" double precision NOT NULL DEFAULT '0', "consent_state" text, "consent_asked_at" TIMESTAMP WITH TIME ZONE, "consent_answered_at" TIMESTAMP WITH TIME ZONE, "consent_by_account_id" uuid, "consent_words" text NOT NULL DEFAULT '', "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "rework_note_showing_asks_consent" CHECK ("shows" OR "consent_state" IS NULL), CONSTRAINT "rework_note_consent_known" CHECK ("consent_state" IS NULL OR "consent_state" IN ('asked', 'given', 'refused')), CONSTRAINT "rework_note_state_known" CHECK ("state" IN ('offered', 'agreed', 'other-limits-asked', 'done')), CONSTRAINT "PK_f5e6f9080d5d0c6d7a3aedb43eb" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE INDEX "rework_note_report_idx" ON "rework_note"  ("report_id", "created_at") `);
    await queryRunner.query(
      `CREATE TABLE "shop_member" ("shop_id" uuid NOT NULL, "account_id" uuid NOT NULL, "role" text NOT NULL, "joined_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "shop_member_role_known" CHECK ("role" IN ('owner', 'hand', 'bookkeeper')), CONSTRAINT "PK_95131bbac5c1f883b7aefc69521" PRIMARY KEY ("shop_id", "account_id"))`,
    );
    await queryRunner.query(`CREATE INDEX "shop_member_account_idx" ON "shop_member"  ("account_id") `);
    await queryRunner.query(
      `CREATE TABLE "stored_file" ("id" uuid NOT NULL, "commission_id" uuid NOT NULL, "place" text NOT NULL, "place_id" uuid NOT NULL, "purpose" text NOT NULL, "name" text NOT NULL, "caption" text NOT NULL DEFAULT '', "media_type" text NOT NULL, "byte_size" bigint NOT NULL, "sha256" text NOT NULL, "storage_key" text NOT NULL, "renditions" jsonb, "width" integer, "height" integer, "added_by_account_id" uuid NOT NULL, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "stored_file_purpose_known" CHECK ("purpose" IN ('message', 'before', 'after', 'cover', 'brief', 'condition')), CONSTRAINT "stored_file_place_known" CHECK ("place" IN ('thread', 'report', 'commission')), CONSTRAINT "PK_e140967af84027b493a3ff04fbb" PRIMARY KEY ("id"))`,
    );
    await queryRunner.query(`CREATE INDEX "stored_file_commission_idx" ON "stored_file"  ("commission_id") `);
    await queryRunner.query(
      `CREATE INDEX "stored_file_place_idx" ON "stored_file"  ("place", "place_id", "created_at") `,
    );
    await queryRunner.query(
      `CREATE TABLE "thread_mark" ("thread_id" uuid NOT NULL, "account_id" uuid NOT NULL, "read_sequence" integer NOT NULL, CONSTRAINT "PK_231c8f2d8d199a1e64c6c77f46d" PRIMARY KEY ("thread_id", "account_id"))`,
    );
    await queryRunner.query(
      `CREATE TABLE "web_session" ("sid" text NOT NULL, "sess" json NOT NULL, "expire" TIMESTAMP(6) NOT NULL, CONSTRAINT "PK_e07661598f4722b7fb2b17af469" PRIMARY KEY ("sid"))`,
    );
    await queryRunner.query(`CREATE INDEX "web_session_expire_idx" ON "web_session"  ("expire") `);
    await queryRunner.query(
      `ALTER TABLE "party" ADD CONSTRAINT "FK_eb0e680a16bdcf59fd020c6d747" FOREIGN KEY ("commission_id") REFERENCES "commission"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "party" ADD CONSTRAINT "FK_e49ed91766d69016f4ac6b79256" FOREIGN KEY ("shop_id") REFERENCES "shop"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "party" ADD CONSTRAINT "FK_f39d94ddde335c199a0a0121950" FOREIGN KEY ("account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "part" ADD CONSTRAINT "FK_e0b0faea7024ad7c2031c3a15b9" FOREIGN KEY ("commission_id") REFERENCES "commission"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "part" ADD CONSTRAINT "FK_23abf8d75c5c382a9845fc7664c" FOREIGN KEY ("holder_party_id") REFERENCES "party"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "joint" ADD CONSTRAINT "FK_0e427eff4df9838f2c61b9cb842" FOREIGN KEY ("commission_id") REFERENCES "commission"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "joint" ADD CONSTRAINT "FK_76195c54880391cc8ed2b0615ac" FOREIGN KEY ("hole_part_id") REFERENCES "part"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "joint" ADD CONSTRAINT "FK_be43a2acecf636c1c72a1e123a7" FOREIGN KEY ("shaft_part_id") REFERENCES "part"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "joint" ADD CONSTRAINT "FK_8fc1885a340a860da293b6c50bb" FOREIGN KEY ("hole_party_id") REFERENCES "party"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "joint" ADD CONSTRAINT "FK_1858e5b544d234ae4c8a71e55ea" FOREIGN KEY ("shaft_party_id") REFERENCES "party"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "leg" ADD CONSTRAINT "FK_0ca7084eaa6f3072a37b84b6dbe" FOREIGN KEY ("commission_id") REFERENCES "commission"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "leg" ADD CONSTRAINT "FK_f60956e9cc1a8be47006650c142" FOREIGN KEY ("party_id") REFERENCES "party"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "leg" ADD CONSTRAINT "FK_49721be670e765337a1b3224bd3" FOREIGN KEY ("part_id") REFERENCES "part"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "fit_report" ADD CONSTRAINT "FK_d6edfdb364ff58299bb730a0257" FOREIGN KEY ("commission_id") REFERENCES "commission"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "fit_report" ADD CONSTRAINT "FK_9d0a3af70b0f46a196151086571" FOREIGN KEY ("joint_id") REFERENCES "joint"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "fit_report" ADD CONSTRAINT "FK_f3f209366dd51b51f43f018ec3b" FOREIGN KEY ("held_leg_id") REFERENCES "leg"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "fit_report" ADD CONSTRAINT "FK_3e3d2f89f50cd0b9101cf2a86e9" FOREIGN KEY ("raised_by_party_id") REFERENCES "party"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "fit_report" ADD CONSTRAINT "FK_81352858cd3300a469cf93e8ab0" FOREIGN KEY ("raised_by_account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "fit_report" ADD CONSTRAINT "FK_ec4066da2583ef199f9fff0ba2d" FOREIGN KEY ("answer_party_id") REFERENCES "party"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "handoff" ADD CONSTRAINT "FK_0ff71b657251e8a7a85a9224d2a" FOREIGN KEY ("commission_id") REFERENCES "commission"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "handoff" ADD CONSTRAINT "FK_00a3af9f65653e482811c109cd5" FOREIGN KEY ("from_party_id") REFERENCES "party"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "handoff" ADD CONSTRAINT "FK_86baf9e1815e2ba373c88ae0bf9" FOREIGN KEY ("to_party_id") REFERENCES "party"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "handoff" ADD CONSTRAINT "FK_6ea48c70ab300d0e2195b7ea342" FOREIGN KEY ("from_leg_id") REFERENCES "leg"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "handoff" ADD CONSTRAINT "FK_f981fc796392a1bfaa7bbecd54a" FOREIGN KEY ("to_leg_id") REFERENCES "leg"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "handoff_offer" ADD CONSTRAINT "FK_34e9082239d8d0defdc4ce161a4" FOREIGN KEY ("handoff_id") REFERENCES "handoff"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "handoff_offer" ADD CONSTRAINT "FK_fb44bc433006c0da3f075120bba" FOREIGN KEY ("by_party_id") REFERENCES "party"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "handoff_offer" ADD CONSTRAINT "FK_5ba0303a13096a607fcea0b6d50" FOREIGN KEY ("by_account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "handoff_offer" ADD CONSTRAINT "FK_47f53797701e000638eec9953b0" FOREIGN KEY ("answered_by_account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "history_line" ADD CONSTRAINT "FK_430fa8bad60c422062e4a57650d" FOREIGN KEY ("commission_id") REFERENCES "commission"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "history_line" ADD CONSTRAINT "FK_f0c5b3b5bbd5adfaa58c23c1b4d" FOREIGN KEY ("account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "idempotency_key" ADD CONSTRAINT "FK_ca9dc4d77fbcc5305d851140072" FOREIGN KEY ("account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "invitation" ADD CONSTRAINT "FK_a48c0838a7445e8b29450a78ec2" FOREIGN KEY ("commission_id") REFERENCES "commission"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "invitation" ADD CONSTRAINT "FK_3e3f19aad303d2fe0096dbf15a7" FOREIGN KEY ("shop_id") REFERENCES "shop"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "invitation" ADD CONSTRAINT "FK_615fc9caf3554c0ae2c630ff5ab" FOREIGN KEY ("invited_by_account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "leg_order" ADD CONSTRAINT "FK_a01444455d7974edbba1347152d" FOREIGN KEY ("leg_id") REFERENCES "leg"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "leg_order" ADD CONSTRAINT "FK_a3a6a3410539814236a781848a6" FOREIGN KEY ("after_leg_id") REFERENCES "leg"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "thread" ADD CONSTRAINT "FK_e6c236ff555dfb82e362aeda976" FOREIGN KEY ("commission_id") REFERENCES "commission"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "thread" ADD CONSTRAINT "FK_5edc1422a3c10c22581af23a564" FOREIGN KEY ("opened_by_party_id") REFERENCES "party"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "message" ADD CONSTRAINT "FK_11cb07b9ecf8cb247c5e2dc86ab" FOREIGN KEY ("thread_id") REFERENCES "thread"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "message" ADD CONSTRAINT "FK_b907a88c9856aa05202086d26da" FOREIGN KEY ("author_account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "message" ADD CONSTRAINT "FK_41134721e46def31493e2f37167" FOREIGN KEY ("author_party_id") REFERENCES "party"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "password_reset" ADD CONSTRAINT "FK_c491bba845232ca65b799a63252" FOREIGN KEY ("account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "reading" ADD CONSTRAINT "FK_b5d428762d2c1c1468e176d0826" FOREIGN KEY ("joint_id") REFERENCES "joint"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "reading" ADD CONSTRAINT "FK_7a982c07c77b936583b8582c009" FOREIGN KEY ("report_id") REFERENCES "fit_report"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "reading" ADD CONSTRAINT "FK_1ad9994f38bae81cf1f24a41b55" FOREIGN KEY ("party_id") REFERENCES "party"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "reading" ADD CONSTRAINT "FK_ff7167296e5bedcbae2316ebb6d" FOREIGN KEY ("account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "recovery_code" ADD CONSTRAINT "FK_9db6a6c505946232618e26c79e8" FOREIGN KEY ("account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "report_event" ADD CONSTRAINT "FK_9f7058f69340ff581e6edfe1f6f" FOREIGN KEY ("report_id") REFERENCES "fit_report"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "report_event" ADD CONSTRAINT "FK_b82abdc8606de0900105e0cde87" FOREIGN KEY ("account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "rework_note" ADD CONSTRAINT "FK_0bf1e57c0c03d157a2c51a6db33" FOREIGN KEY ("report_id") REFERENCES "fit_report"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "rework_note" ADD CONSTRAINT "FK_48bf354fced04c6050d0cda28a8" FOREIGN KEY ("party_id") REFERENCES "party"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "rework_note" ADD CONSTRAINT "FK_2973928722891a9a8f747aa1425" FOREIGN KEY ("account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "rework_note" ADD CONSTRAINT "FK_b4e9bde782f547aab7686833a26" FOREIGN KEY ("cost_borne_by_party_id") REFERENCES "party"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "rework_note" ADD CONSTRAINT "FK_d7c3fcbbda1dca740279d8644cb" FOREIGN KEY ("consent_by_account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "shop_member" ADD CONSTRAINT "FK_6580686953174e8abb353ed9aca" FOREIGN KEY ("shop_id") REFERENCES "shop"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "shop_member" ADD CONSTRAINT "FK_5436cd8e9f669fcd48f2f1e95df" FOREIGN KEY ("account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "stored_file" ADD CONSTRAINT "FK_e3d32570bda4c66220a21f2984a" FOREIGN KEY ("commission_id") REFERENCES "commission"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "stored_file" ADD CONSTRAINT "FK_40015b671eb4473ffd897b900dc" FOREIGN KEY ("added_by_account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "thread_mark" ADD CONSTRAINT "FK_c612f3780d180e3c7fab7ed195e" FOREIGN KEY ("thread_id") REFERENCES "thread"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE "thread_mark" ADD CONSTRAINT "FK_65b616ba9ee71dbe8dfc0af963a" FOREIGN KEY ("account_id") REFERENCES "account"("id") ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
  }

  public async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE "thread_mark" DROP CONSTRAINT "FK_65b616ba9ee71dbe8dfc0af963a"`);
    await queryRunner.query(`ALTER TABLE "thread_mark" DROP CONSTRAINT "FK_c612f3780d180e3c7fab7ed195e"`);
    await queryRunner.query(`ALTER TABLE "stored_file" DROP CONSTRAINT "FK_40015b671eb4473ffd897b900dc"`);
    await queryRunner.query(`ALTER TABLE "stored_file" DROP CONSTRAINT "FK_e3d32570bda4c66220a21f2984a"`);
    await queryRunner.query(`ALTER TABLE "shop_member" DROP CONSTRAINT "FK_5436cd8e9f669fcd48f2f1e95df"`);
    await queryRunner.query(`ALTER TABLE "shop_member" DROP CONSTRAINT "FK_6580686953174e8abb353ed9aca"`);
    await queryRunner.query(`ALTER TABLE "rework_note" DROP CONSTRAINT "FK_d7c3fcbbda1dca740279d8644cb"`);
    await queryRunner.query(`ALTER TABLE "rework_note" DROP CONSTRAINT "FK_b4e9bde782f547aab7686833a26"`);
    await queryRunner.query(`ALTER TABLE "rework_note" DROP CONSTRAINT "FK_2973928722891a9a8f747aa1425"`);
    await queryRunner.query(`ALTER TABLE "rework_note" DROP CONSTRAINT "FK_48bf354fced04c6050d0cda28a8"`);
    await queryRunner.query(`ALTER TABLE "rework_note" DROP CONSTRAINT "FK_0bf1e57c0c03d157a2c51a6db33"`);
    await queryRunner.query(`ALTER TABLE "report_event" DROP CONSTRAINT "FK_b82abdc8606de0900105e0cde87"`);
    await queryRunner.query(`ALTER TABLE "report_event" DROP CONSTRAINT "FK_9f7058f69340ff581e6edfe1f6f"`);
    await queryRunner.query(`ALTER TABLE "recovery_code" DROP CONSTRAINT "FK_9db6a6c505946232618e26c79e8"`);
    await queryRunner.query(`ALTER TABLE "reading" DROP CONSTRAINT "FK_ff7167296e5bedcbae2316ebb6d"`);
    await queryRunner.query(`ALTER TABLE "reading" DROP CONSTRAINT "FK_1ad9994f38bae81cf1f24a41b55"`);
    await queryRunner.query(`ALTER TABLE "reading" DROP CONSTRAINT "FK_7a982c07c77b936583b8582c009"`);
    await queryRunner.query(`ALTER TABLE "reading" DROP CONSTRAINT "FK_b5d428762d2c1c1468e176d0826"`);
    await queryRunner.query(`ALTER TABLE "password_reset" DROP CONSTRAINT "FK_c491bba845232ca65b799a63252"`);
    await queryRunner.query(`ALTER TABLE "message" DROP CONSTRAINT "FK_41134721e46def31493e2f37167"`);
    await queryRunner.query(`ALTER TABLE "message" DROP CONSTRAINT "FK_b907a88c9856aa05202086d26da"`);
    await queryRunner.query(`ALTER TABLE "message" DROP CONSTRAINT "FK_11cb07b9ecf8cb247c5e2dc86ab"`);
    await queryRunner.query(`ALTER TABLE "thread" DROP CONSTRAINT "FK_5edc1422a3c10c22581af23a564"`);
    await queryRunner.query(`ALTER TABLE "thread" DROP CONSTRAINT "FK_e6c236ff555dfb82e362aeda976"`);
    await queryRunner.query(`ALTER TABLE "leg_order" DROP CONSTRAINT "FK_a3a6a3410539814236a781848a6"`);
    await queryRunner.query(`ALTER TABLE "leg_order" DROP CONSTRAINT "FK_a01444455d7974edbba1347152d"`);
    await queryRunner.query(`ALTER TABLE "invitation" DROP CONSTRAINT "FK_615fc9caf3554c0ae2c630ff5ab"`);
    await queryRunner.query(`ALTER TABLE "invitation" DROP CONSTRAINT "FK_3e3f19aad303d2fe0096dbf15a7"`);
    await queryRunner.query(`ALTER TABLE "invitation" DROP CONSTRAINT "FK_a48c0838a7445e8b29450a78ec2"`);
    await queryRunner.query(`ALTER TABLE "idempotency_key" DROP CONSTRAINT "FK_ca9dc4d77fbcc5305d851140072"`);
    await queryRunner.query(`ALTER TABLE "history_line" DROP CONSTRAINT "FK_f0c5b3b5bbd5adfaa58c23c1b4d"`);
    await queryRunner.query(`ALTER TABLE "history_line" DROP CONSTRAINT "FK_430fa8bad60c422062e4a57650d"`);
    await queryRunner.query(`ALTER TABLE "handoff_offer" DROP CONSTRAINT "FK_47f53797701e000638eec9953b0"`);
    await queryRunner.query(`ALTER TABLE "handoff_offer" DROP CONSTRAINT "FK_5ba0303a13096a607fcea0b6d50"`);
    await queryRunner.query(`ALTER TABLE "handoff_offer" DROP CONSTRAINT "FK_fb44bc433006c0da3f075120bba"`);
    await queryRunner.query(`ALTER TABLE "handoff_offer" DROP CONSTRAINT "FK_34e9082239d8d0defdc4ce161a4"`);
    await queryRunner.query(`ALTER TABLE "handoff" DROP CONSTRAINT "FK_f981fc796392a1bfaa7bbecd54a"`);
    await queryRunner.query(`ALTER TABLE "handoff" DROP CONSTRAINT "FK_6ea48c70ab300d0e2195b7ea342"`);
    await queryRunner.query(`ALTER TABLE "handoff" DROP CONSTRAINT "FK_86baf9e1815e2ba373c88ae0bf9"`);
    await queryRunner.query(`ALTER TABLE "handoff" DROP CONSTRAINT "FK_00a3af9f65653e482811c109cd5"`);
    await queryRunner.query(`ALTER TABLE "handoff" DROP CONSTRAINT "FK_0ff71b657251e8a7a85a9224d2a"`);
    await queryRunner.query(`ALTER TABLE "fit_report" DROP CONSTRAINT "FK_ec4066da2583ef199f9fff0ba2d"`);
    await queryRunner.query(`ALTER TABLE "fit_report" DROP CONSTRAINT "FK_81352858cd3300a469cf93e8ab0"`);
    await queryRunner.query(`ALTER TABLE "fit_report" DROP CONSTRAINT "FK_3e3d2f89f50cd0b9101cf2a86e9"`);
    await queryRunner.query(`ALTER TABLE "fit_report" DROP CONSTRAINT "FK_f3f209366dd51b51f43f018ec3b"`);
    await queryRunner.query(`ALTER TABLE "fit_report" DROP CONSTRAINT "FK_9d0a3af70b0f46a196151086571"`);
    await queryRunner.query(`ALTER TABLE "fit_report" DROP CONSTRAINT "FK_d6edfdb364ff58299bb730a0257"`);
    await queryRunner.query(`ALTER TABLE "leg" DROP CONSTRAINT "FK_49721be670e765337a1b3224bd3"`);
    await queryRunner.query(`ALTER TABLE "leg" DROP CONSTRAINT "FK_f60956e9cc1a8be47006650c142"`);
    await queryRunner.query(`ALTER TABLE "leg" DROP CONSTRAINT "FK_0ca7084eaa6f3072a37b84b6dbe"`);
    await queryRunner.query(`ALTER TABLE "joint" DROP CONSTRAINT "FK_1858e5b544d234ae4c8a71e55ea"`);
    await queryRunner.query(`ALTER TABLE "joint" DROP CONSTRAINT "FK_8fc1885a340a860da293b6c50bb"`);
    await queryRunner.query(`ALTER TABLE "joint" DROP CONSTRAINT "FK_be43a2acecf636c1c72a1e123a7"`);
    await queryRunner.query(`ALTER TABLE "joint" DROP CONSTRAINT "FK_76195c54880391cc8ed2b0615ac"`);
    await queryRunner.query(`ALTER TABLE "joint" DROP CONSTRAINT "FK_0e427eff4df9838f2c61b9cb842"`);
    await queryRunner.query(`ALTER TABLE "part" DROP CONSTRAINT "FK_23abf8d75c5c382a9845fc7664c"`);
    await queryRunner.query(`ALTER TABLE "part" DROP CONSTRAINT "FK_e0b0faea7024ad7c2031c3a15b9"`);
    await queryRunner.query(`ALTER TABLE "party" DROP CONSTRAINT "FK_f39d94ddde335c199a0a0121950"`);
    await queryRunner.query(`ALTER TABLE "party" DROP CONSTRAINT "FK_e49ed91766d69016f4ac6b79256"`);
    await queryRunner.query(`ALTER TABLE "party" DROP CONSTRAINT "FK_eb0e680a16bdcf59fd020c6d747"`);
    await queryRunner.query(`DROP INDEX "public"."web_session_expire_idx"`);
    await queryRunner.query(`DROP TABLE "web_session"`);
    await queryRunner.query(`DROP TABLE "thread_mark"`);
    await queryRunner.query(`DROP INDEX "public"."stored_file_place_idx"`);
    await queryRunner.query(`DROP INDEX "public"."stored_file_commission_idx"`);
    await queryRunner.query(`DROP TABLE "stored_file"`);
    await queryRunner.query(`DROP INDEX "public"."shop_member_account_idx"`);
    await queryRunner.query(`DROP TABLE "shop_member"`);
    await queryRunner.query(`DROP INDEX "public"."rework_note_report_idx"`);
    await queryRunner.query(`DROP TABLE "rework_note"`);
    await queryRunner.query(`DROP INDEX "public"."report_event_report_idx"`);
    await queryRunner.query(`DROP TABLE "report_event"`);
    await queryRunner.query(`DROP INDEX "public"."recovery_code_account_idx"`);
    await queryRunner.query(`DROP TABLE "recovery_code"`);
    await queryRunner.query(`DROP INDEX "public"."reading_joint_set_idx"`);
    await queryRunner.query(`DROP TABLE "reading"`);
    await queryRunner.query(`DROP INDEX "public"."rate_limit_expire_idx"`);
    await queryRunner.query(`DROP TABLE "rate_limit"`);
    await queryRunner.query(`DROP INDEX "public"."password_reset_token_key"`);
    await queryRunner.query(`DROP INDEX "public"."password_reset_account_idx"`);
    await queryRunner.query(`DROP TABLE "password_reset"`);
    await queryRunner.query(`DROP INDEX "public"."outbox_message_unsent_idx"`);
    await queryRunner.query(`DROP TABLE "outbox_message"`);
    await queryRunner.query(`DROP INDEX "public"."message_author_client_id_key"`);
    await queryRunner.query(`DROP TABLE "message"`);
    await queryRunner.query(`DROP INDEX "public"."thread_subject_idx"`);
    await queryRunner.query(`DROP TABLE "thread"`);
    await queryRunner.query(`DROP INDEX "public"."leg_order_after_idx"`);
    await queryRunner.query(`DROP TABLE "leg_order"`);
    await queryRunner.query(`DROP INDEX "public"."invitation_shop_idx"`);
    await queryRunner.query(`DROP INDEX "public"."invitation_commission_idx"`);
    await queryRunner.query(`DROP INDEX "public"."invitation_token_key"`);
    await queryRunner.query(`DROP TABLE "invitation"`);
    await queryRunner.query(`DROP INDEX "public"."idempotency_key_age_idx"`);
    await queryRunner.query(`DROP TABLE "idempotency_key"`);
    await queryRunner.query(`DROP INDEX "public"."history_line_commission_idx"`);
    await queryRunner.query(`DROP TABLE "history_line"`);
    await queryRunner.query(`DROP INDEX "public"."handoff_offer_handoff_idx"`);
    await queryRunner.query(`DROP INDEX "public"."handoff_offer_one_standing_key"`);
    await queryRunner.query(`DROP TABLE "handoff_offer"`);
    await queryRunner.query(`DROP INDEX "public"."handoff_to_idx"`);
    await queryRunner.query(`DROP INDEX "public"."handoff_from_idx"`);
    await queryRunner.query(`DROP INDEX "public"."handoff_commission_idx"`);
    await queryRunner.query(`DROP TABLE "handoff"`);
    await queryRunner.query(`DROP INDEX "public"."fit_report_open_on_joint_key"`);
    await queryRunner.query(`DROP INDEX "public"."fit_report_held_leg_idx"`);
    await queryRunner.query(`DROP INDEX "public"."fit_report_commission_idx"`);
    await queryRunner.query(`DROP TABLE "fit_report"`);
    await queryRunner.query(`DROP INDEX "public"."leg_party_idx"`);
    await queryRunner.query(`DROP INDEX "public"."leg_commission_idx"`);
    await queryRunner.query(`DROP TABLE "leg"`);
    await queryRunner.query(`DROP INDEX "public"."joint_commission_idx"`);
    await queryRunner.query(`DROP TABLE "joint"`);
    await queryRunner.query(`DROP INDEX "public"."part_commission_idx"`);
    await queryRunner.query(`DROP TABLE "part"`);
    await queryRunner.query(`DROP INDEX "public"."party_commission_shop_key"`);
    await queryRunner.query(`DROP INDEX "public"."party_commission_account_key"`);
    await queryRunner.query(`DROP INDEX "public"."party_account_idx"`);
    await queryRunner.query(`DROP INDEX "public"."party_shop_idx"`);
    await queryRunner.query(`DROP TABLE "party"`);
    await queryRunner.query(`DROP TABLE "shop"`);
    await queryRunner.query(`DROP INDEX "public"."commission_latest_idx"`);
    await queryRunner.query(`DROP INDEX "public"."commission_member_keys_idx"`);
    await queryRunner.query(`DROP INDEX "public"."commission_code_key"`);
    await queryRunner.query(`DROP TABLE "commission"`);
    await queryRunner.query(`DROP INDEX "public"."account_email_key"`);
    await queryRunner.query(`DROP TABLE "account"`);
  }
}
