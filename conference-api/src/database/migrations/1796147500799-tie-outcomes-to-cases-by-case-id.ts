import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieOutcomesToCasesByCaseId1796147500799 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`outcomes\` ADD CONSTRAINT \`FK_dc8e47d65d534a75297014038f7\` FOREIGN KEY (\`caseId\`) REFERENCES \`cases\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP INDEX \`IDX_53603454609bce835861c30428\` ON \`outcomes\``);
  }
}
