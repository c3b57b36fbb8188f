import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableOneTimeTokens1796149650217 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`one_time_tokens\` (\`hash\` char(64) NOT NULL, \`purpose\` varchar(20) NOT NULL, \`personId\` uuid NOT NULL, \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), \`expiresAt\` datetime(3) NOT NULL, \`usedAt\` datetime(3) NULL, INDEX \`IDX_fe7093c727c51189e572e017de\` (\`personId\`), PRIMARY KEY (\`hash\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`one_time_tokens\``);
  }
}
