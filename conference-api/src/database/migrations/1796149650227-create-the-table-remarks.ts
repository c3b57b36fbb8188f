import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableRemarks1796149650227 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`remarks\` (\`id\` uuid NOT NULL, \`threadId\` uuid NOT NULL, \`caseId\` uuid NOT NULL, \`authorId\` uuid NOT NULL, \`replyToId\` uuid NULL, \`content\` json NULL, \`plainText\` mediumtext NOT NULL, \`version\` int NOT NULL DEFAULT '1', \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), \`editedAt\` datetime(3) NULL, \`deletedAt\` datetime(3) NULL, FULLTEXT INDEX \`IDX_57f38e4851392a5536976fc9a9\` (\`plainText\`), INDEX \`IDX_e0f026afd5a88d0640971c6bbc\` (\`caseId\`, \`createdAt\`), INDEX \`IDX_fd2e530329a25636ced45a16fa\` (\`threadId\`, \`createdAt\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`remarks\``);
  }
}
