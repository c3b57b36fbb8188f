import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableFinalDecisions1796149650224 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`final_decisions\` (\`id\` uuid NOT NULL, \`caseId\` uuid NOT NULL, \`version\` int NOT NULL, \`kind\` varchar(16) NOT NULL, \`reason\` text NOT NULL, \`plannedWeek\` varchar(8) NULL, \`patientInformed\` tinyint NULL, \`byId\` uuid NOT NULL, \`at\` datetime(3) NOT NULL, UNIQUE INDEX \`IDX_197d6c0fc5d05a91fa3f13c127\` (\`caseId\`, \`version\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`final_decisions\``);
  }
}
