import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieCaseImagesToCasesByCaseId1796149650263 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`case_images\` ADD CONSTRAINT \`FK_3bdb7a5b3290944a9aba8105ae5\` FOREIGN KEY (\`caseId\`) REFERENCES \`cases\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`case_images\` DROP FOREIGN KEY \`FK_3bdb7a5b3290944a9aba8105ae5\``);
  }
}
