import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableMentions1796147500758 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`mentions\` (\`remarkId\` uuid NOT NULL, \`personId\` uuid NOT NULL, INDEX \`IDX_da6086454b0d1f12bd59723496\` (\`personId\`), PRIMARY KEY (\`remarkId\`, \`personId\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP INDEX \`IDX_f1c386a27158e892abfd3d8eea\` ON \`sign_in_failures\``);
  }
}
