import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableCaseVersions1796147500752 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`case_versions\` (\`caseId\` uuid NOT NULL, \`version\` int NOT NULL, \`content\` json NOT NULL, \`authorId\` uuid NOT NULL, \`at\` datetime(3) NOT NULL, PRIMARY KEY (\`caseId\`, \`version\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP INDEX \`IDX_c77e8752faa45901af2b245dff\` ON \`people\``);
  }
}
