import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieAttendancesToPeopleByPersonId1796149650268 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`attendances\` ADD CONSTRAINT \`FK_55eab5a4e6f12662b12f8a09ad2\` FOREIGN KEY (\`personId\`) REFERENCES \`people\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`attendances\` DROP FOREIGN KEY \`FK_55eab5a4e6f12662b12f8a09ad2\``);
  }
}
