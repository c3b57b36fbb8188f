import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieCaseReadingsToCasesByCaseId1796149650256 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`case_readings\` ADD CONSTRAINT \`FK_a235c86c23608c6898d95d2629b\` FOREIGN KEY (\`caseId\`) REFERENCES \`cases\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`case_readings\` DROP FOREIGN KEY \`FK_a235c86c23608c6898d95d2629b\``);
  }
}
