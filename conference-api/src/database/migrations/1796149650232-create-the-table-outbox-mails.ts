import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableOutboxMails1796149650232 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`outbox_mails\` (\`id\` bigint NOT NULL AUTO_INCREMENT, \`purpose\` varchar(160) NOT NULL, \`personId\` uuid NULL, \`recipient\` varchar(254) NOT NULL, \`template\` varchar(40) NOT NULL, \`data\` json NOT NULL, \`priority\` tinyint NOT NULL DEFAULT '5', \`state\` varchar(12) NOT NULL DEFAULT 'queued', \`attempts\` int NOT NULL DEFAULT '0', \`nextAttemptAt\` datetime(3) NOT NULL, \`claimedBy\` varchar(64) NULL, \`claimedUntil\` datetime(3) NULL, \`messageId\` varchar(120) NOT NULL, \`lastError\` varchar(300) NULL, \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), \`sentAt\` datetime(3) NULL, INDEX \`IDX_c91b9dac5cd0c0980d838eaebe\` (\`state\`, \`nextAttemptAt\`, \`priority\`), UNIQUE INDEX \`IDX_915b15cd626e926b67dbf3b9b1\` (\`purpose\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`outbox_mails\``);
  }
}
