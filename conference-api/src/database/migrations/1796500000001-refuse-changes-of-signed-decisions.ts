import type { MigrationInterface, QueryRunner } from 'typeorm';

// Hand-written: a second line behind the routes, for whoever reaches the table by another way.
export class RefuseChangesOfSignedDecisions1796500000001 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(
      "CREATE TRIGGER signed_decisions_stay BEFORE UPDATE ON decisions FOR EACH ROW IF OLD.signedAt IS NOT NULL THEN SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A signed decision is never changed'; END IF",
    );
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query('DROP TRIGGER signed_decisions_stay');
  }
}
