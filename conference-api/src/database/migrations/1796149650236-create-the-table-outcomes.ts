import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableOutcomes1796149650236 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`outcomes\` (\`id\` uuid NOT NULL, \`caseId\` uuid NOT NULL, \`version\` int NOT NULL, \`content\` json NOT NULL, \`amendmentReason\` text NULL, \`byId\` uuid NOT NULL, \`at\` datetime(3) NOT NULL, UNIQUE INDEX \`IDX_53603454609bce835861c30428\` (\`caseId\`, \`version\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`outcomes\``);
  }
}
