import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieRemarkVersionsToRemarksByRemarkId1796149650262 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`remark_versions\` ADD CONSTRAINT \`FK_eda97d588bcdc3a51798f098d10\` FOREIGN KEY (\`remarkId\`) REFERENCES \`remarks\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`remark_versions\` DROP FOREIGN KEY \`FK_eda97d588bcdc3a51798f098d10\``);
  }
}
