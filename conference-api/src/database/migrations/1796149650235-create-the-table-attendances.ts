import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableAttendances1796149650235 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`attendances\` (\`meetingId\` uuid NOT NULL, \`personId\` uuid NOT NULL, \`state\` varchar(10) NOT NULL, \`at\` datetime(3) NOT NULL, PRIMARY KEY (\`meetingId\`, \`personId\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`attendances\``);
  }
}
