import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableDecisions1796149650223 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`decisions\` (\`id\` uuid NOT NULL, \`conferenceId\` uuid NOT NULL, \`caseId\` uuid NOT NULL, \`meetingId\` uuid NULL, \`version\` int NOT NULL, \`number\` int NULL, \`content\` json NOT NULL, \`revision\` int NOT NULL DEFAULT '1', \`amendmentReason\` text NULL, \`draftedById\` uuid NOT NULL, \`signedById\` uuid NULL, \`signedAt\` datetime(3) NULL, \`record\` json NULL, \`hash\` char(64) NULL, \`previousHash\` char(64) NULL, \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), INDEX \`IDX_ec7ccbb7b2ce96cb908298fb25\` (\`conferenceId\`, \`signedAt\`), UNIQUE INDEX \`IDX_bc59fc6c0f781a45b20e2e36df\` (\`conferenceId\`, \`number\`), UNIQUE INDEX \`IDX_5c7ba44f1543fcfa243dbc43e6\` (\`caseId\`, \`version\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`decisions\``);
  }
}
