import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableConferences1796149650213 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`conferences\` (\`id\` uuid NOT NULL, \`name\` varchar(120) NOT NULL, \`code\` varchar(6) NOT NULL, \`timeZone\` varchar(64) NOT NULL, \`slotStart\` varchar(16) NOT NULL, \`slotRule\` varchar(200) NOT NULL DEFAULT 'FREQ=WEEKLY', \`slotMinutes\` int NOT NULL DEFAULT '60', \`agendaHoursBefore\` int NOT NULL DEFAULT '48', \`quorumRule\` json NOT NULL, \`consensusRule\` varchar(20) NOT NULL DEFAULT 'rand', \`namesShown\` varchar(20) NOT NULL DEFAULT 'nobody', \`lastCaseNumber\` int NOT NULL DEFAULT '0', \`lastDecisionNumber\` int NOT NULL DEFAULT '0', \`version\` int NOT NULL, \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), UNIQUE INDEX \`IDX_647dc3f6530b6e694cb3dac156\` (\`name\`), UNIQUE INDEX \`IDX_a86e93faedcac4d3a5c194099d\` (\`code\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`conferences\``);
  }
}
