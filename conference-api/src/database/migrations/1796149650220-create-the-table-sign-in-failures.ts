import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableSignInFailures1796149650220 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`sign_in_failures\` (\`id\` bigint NOT NULL AUTO_INCREMENT, \`account\` char(64) NOT NULL, \`address\` varchar(64) NOT NULL, \`at\` datetime(3) NOT NULL, INDEX \`IDX_f1c386a27158e892abfd3d8eea\` (\`address\`, \`at\`), INDEX \`IDX_a9712ef7376a814afea0f335b5\` (\`account\`, \`at\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`sign_in_failures\``);
  }
}
