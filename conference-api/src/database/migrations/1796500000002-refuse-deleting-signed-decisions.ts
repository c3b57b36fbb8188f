import type { MigrationInterface, QueryRunner } from 'typeorm';

// Hand-written: as above, for deleting.
export class RefuseDeletingSignedDecisions1796500000002 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(
      "CREATE TRIGGER signed_decisions_remain BEFORE DELETE ON decisions FOR EACH ROW IF OLD.signedAt IS NOT NULL THEN SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A signed decision is never deleted'; END IF",
    );
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query('DROP TRIGGER signed_decisions_remain');
  }
}
