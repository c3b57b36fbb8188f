import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableSessions1796149650218 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`sessions\` (\`id\` uuid NOT NULL, \`personId\` uuid NOT NULL, \`device\` varchar(255) NOT NULL, \`address\` varchar(64) NOT NULL, \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), \`lastUsedAt\` datetime(3) NOT NULL, \`expiresAt\` datetime(3) NOT NULL, \`endedAt\` datetime(3) NULL, \`endedWhy\` varchar(40) NULL, PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`sessions\``);
  }
}
