import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieDecisionsToCasesByCaseId1796149650252 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`decisions\` ADD CONSTRAINT \`FK_ecb65941e410888bca10d3114dd\` FOREIGN KEY (\`caseId\`) REFERENCES \`cases\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`decisions\` DROP FOREIGN KEY \`FK_ecb65941e410888bca10d3114dd\``);
  }
}
