import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieOutcomesToCasesByCaseId1796149650269 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`outcomes\` ADD CONSTRAINT \`FK_dc8e47d65d534a75297014038f7\` FOREIGN KEY (\`caseId\`) REFERENCES \`cases\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`outcomes\` DROP FOREIGN KEY \`FK_dc8e47d65d534a75297014038f7\``);
  }
}
