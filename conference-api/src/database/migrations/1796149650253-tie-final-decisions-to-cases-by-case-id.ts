import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieFinalDecisionsToCasesByCaseId1796149650253 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`final_decisions\` ADD CONSTRAINT \`FK_feaac84be45b687af17f396afa8\` FOREIGN KEY (\`caseId\`) REFERENCES \`cases\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`final_decisions\` DROP FOREIGN KEY \`FK_feaac84be45b687af17f396afa8\``);
  }
}
