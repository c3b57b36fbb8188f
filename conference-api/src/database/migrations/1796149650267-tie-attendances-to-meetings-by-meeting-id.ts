import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieAttendancesToMeetingsByMeetingId1796149650267 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`attendances\` ADD CONSTRAINT \`FK_31cfa7460568c294de880c37cee\` FOREIGN KEY (\`meetingId\`) REFERENCES \`meetings\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`attendances\` DROP FOREIGN KEY \`FK_31cfa7460568c294de880c37cee\``);
  }
}
