import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieCaseReadingsToPeopleByPersonId1796149650255 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`case_readings\` ADD CONSTRAINT \`FK_08c8307a7374e2ae8c086082451\` FOREIGN KEY (\`personId\`) REFERENCES \`people\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`case_readings\` DROP FOREIGN KEY \`FK_08c8307a7374e2ae8c086082451\``);
  }
}
