import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableMentions1796149650228 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`mentions\` (\`remarkId\` uuid NOT NULL, \`personId\` uuid NOT NULL, INDEX \`IDX_da6086454b0d1f12bd59723496\` (\`personId\`), PRIMARY KEY (\`remarkId\`, \`personId\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`mentions\``);
  }
}
