import type { MigrationInterface, QueryRunner } from 'typeorm';

/** A handoff that will not come about is taken out of the plan and stays on record. */
export class DroppedHandoffs1796141000000 implements MigrationInterface {
  name = 'DroppedHandoffs1796141000000';

  public async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE "handoff" ADD "dropped_at" TIMESTAMP WITH TIME ZONE`);
    await queryRunner.query(`ALTER TABLE "handoff" ADD "dropped_words" text NOT NULL DEFAULT ''`);
  }

  public async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE "handoff" DROP COLUMN "dropped_words"`);
    await queryRunner.query(`ALTER TABLE "handoff" DROP COLUMN "dropped_at"`);
  }
}
