import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableCaseVersions1796149650222 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`case_versions\` (\`caseId\` uuid NOT NULL, \`version\` int NOT NULL, \`content\` json NOT NULL, \`authorId\` uuid NOT NULL, \`at\` datetime(3) NOT NULL, PRIMARY KEY (\`caseId\`, \`version\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`case_versions\``);
  }
}
