import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieRatingRoundsToCasesByCaseId1796149650272 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`rating_rounds\` ADD CONSTRAINT \`FK_938aafddaf70bbe4ca9add98736\` FOREIGN KEY (\`caseId\`) REFERENCES \`cases\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`rating_rounds\` DROP FOREIGN KEY \`FK_938aafddaf70bbe4ca9add98736\``);
  }
}
