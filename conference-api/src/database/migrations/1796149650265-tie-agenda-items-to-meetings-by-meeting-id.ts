import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieAgendaItemsToMeetingsByMeetingId1796149650265 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`agenda_items\` ADD CONSTRAINT \`FK_1ca4905077ea055490798c7b133\` FOREIGN KEY (\`meetingId\`) REFERENCES \`meetings\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`agenda_items\` DROP FOREIGN KEY \`FK_1ca4905077ea055490798c7b133\``);
  }
}
