import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableRemarkVersions1796149650229 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`remark_versions\` (\`remarkId\` uuid NOT NULL, \`version\` int NOT NULL, \`content\` json NOT NULL, \`at\` datetime(3) NOT NULL, PRIMARY KEY (\`remarkId\`, \`version\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`remark_versions\``);
  }
}
