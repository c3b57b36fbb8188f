import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieCasesToConferencesByConferenceId1796149650246 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`cases\` ADD CONSTRAINT \`FK_1f4d9febbc4ba01631569d6e110\` FOREIGN KEY (\`conferenceId\`) REFERENCES \`conferences\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`cases\` DROP FOREIGN KEY \`FK_1f4d9febbc4ba01631569d6e110\``);
  }
}
