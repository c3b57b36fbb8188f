import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableRefreshTokens1796149650219 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`refresh_tokens\` (\`hash\` char(64) NOT NULL, \`sessionId\` uuid NOT NULL, \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), \`usedAt\` datetime(3) NULL, PRIMARY KEY (\`hash\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`refresh_tokens\``);
  }
}
