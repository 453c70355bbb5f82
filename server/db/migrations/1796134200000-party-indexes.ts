import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Who is asking, and who hears an event, are looked up by commission in every request. */
export class PartyIndexes1796134200000 implements MigrationInterface {
  name = 'PartyIndexes1796134200000';

  public async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE INDEX "party_commission_idx" ON "party"  ("commission_id") `);
    await queryRunner.query(`CREATE INDEX "party_shop_guest_idx" ON "party"  ("shop_id") WHERE 'guest' = ANY("roles")`);
  }

  public async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP INDEX "public"."party_shop_guest_idx"`);
    await queryRunner.query(`DROP INDEX "public"."party_commission_idx"`);
  }
}
