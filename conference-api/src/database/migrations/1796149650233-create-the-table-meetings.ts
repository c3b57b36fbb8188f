import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableMeetings1796149650233 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`meetings\` (\`id\` uuid NOT NULL, \`conferenceId\` uuid NOT NULL, \`slotAt\` datetime(3) NOT NULL, \`ofSlot\` tinyint NOT NULL DEFAULT 1, \`startsAt\` datetime(3) NOT NULL, \`minutes\` int NOT NULL, \`state\` varchar(10) NOT NULL DEFAULT 'planned', \`agendaDueAt\` datetime(3) NOT NULL, \`agendaSentAt\` datetime(3) NULL, \`agendaSendings\` int NOT NULL DEFAULT '0', \`agendaSentVersion\` int NULL, \`cancelledReason\` text NULL, \`startedAt\` datetime(3) NULL, \`closedAt\` datetime(3) NULL, \`version\` int NOT NULL DEFAULT '1', \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), INDEX \`IDX_59442bfb715b66763071c06da1\` (\`state\`, \`agendaDueAt\`), INDEX \`IDX_c0b3785273d15e6cbbcea2819f\` (\`conferenceId\`, \`startsAt\`), UNIQUE INDEX \`IDX_6054d421b99b4ed7c550c7a1d9\` (\`conferenceId\`, \`slotAt\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`meetings\``);
  }
}
