import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieRefreshTokensToSessionsBySessionId1796149650245 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`refresh_tokens\` ADD CONSTRAINT \`FK_b25a58a00578bd1b7a01623d2dd\` FOREIGN KEY (\`sessionId\`) REFERENCES \`sessions\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`refresh_tokens\` DROP FOREIGN KEY \`FK_b25a58a00578bd1b7a01623d2dd\``);
  }
}
