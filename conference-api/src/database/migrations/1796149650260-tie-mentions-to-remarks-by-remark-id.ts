import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieMentionsToRemarksByRemarkId1796149650260 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`mentions\` ADD CONSTRAINT \`FK_cb2256ef746d337b7ba974d7012\` FOREIGN KEY (\`remarkId\`) REFERENCES \`remarks\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`mentions\` DROP FOREIGN KEY \`FK_cb2256ef746d337b7ba974d7012\``);
  }
}
