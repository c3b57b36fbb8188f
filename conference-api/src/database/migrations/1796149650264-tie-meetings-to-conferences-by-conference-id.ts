import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieMeetingsToConferencesByConferenceId1796149650264 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`meetings\` ADD CONSTRAINT \`FK_71507fc67ec3825b26be4b1938c\` FOREIGN KEY (\`conferenceId\`) REFERENCES \`conferences\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`meetings\` DROP FOREIGN KEY \`FK_71507fc67ec3825b26be4b1938c\``);
  }
}
