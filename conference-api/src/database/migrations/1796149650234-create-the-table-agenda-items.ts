import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableAgendaItems1796149650234 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`agenda_items\` (\`id\` uuid NOT NULL, \`meetingId\` uuid NOT NULL, \`caseId\` uuid NOT NULL, \`position\` int NOT NULL, \`minutes\` int NOT NULL, \`state\` varchar(10) NOT NULL DEFAULT 'listed', \`deferredReason\` text NULL, INDEX \`IDX_24fd925813c8f4dedd8af36192\` (\`caseId\`), UNIQUE INDEX \`IDX_b228655531512a51f5126f7027\` (\`meetingId\`, \`caseId\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`agenda_items\``);
  }
}
