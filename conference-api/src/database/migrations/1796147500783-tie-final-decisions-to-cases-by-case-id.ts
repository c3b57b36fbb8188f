import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieFinalDecisionsToCasesByCaseId1796147500783 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`final_decisions\` ADD CONSTRAINT \`FK_feaac84be45b687af17f396afa8\` FOREIGN KEY (\`caseId\`) REFERENCES \`cases\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP INDEX \`IDX_af83ac7d3bd8a526bee34b094a\` ON \`live_events\``);
  }
}
