import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableRatingRounds1796149650238 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`rating_rounds\` (\`id\` uuid NOT NULL, \`caseId\` uuid NOT NULL, \`number\` int NOT NULL, \`options\` json NOT NULL, \`caseVersion\` int NOT NULL, \`openedAt\` datetime(3) NOT NULL, \`closedAt\` datetime(3) NULL, UNIQUE INDEX \`IDX_b2d21876b6a52baf8350535bc2\` (\`caseId\`, \`number\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`rating_rounds\``);
  }
}
