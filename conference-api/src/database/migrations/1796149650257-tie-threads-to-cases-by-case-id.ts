import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieThreadsToCasesByCaseId1796149650257 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`threads\` ADD CONSTRAINT \`FK_cf707f87a821a6fca261729e436\` FOREIGN KEY (\`caseId\`) REFERENCES \`cases\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`threads\` DROP FOREIGN KEY \`FK_cf707f87a821a6fca261729e436\``);
  }
}
