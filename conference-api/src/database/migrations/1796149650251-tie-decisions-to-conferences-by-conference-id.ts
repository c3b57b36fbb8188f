import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieDecisionsToConferencesByConferenceId1796149650251 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`decisions\` ADD CONSTRAINT \`FK_970b1b0f22038bfb48aeb65b6ed\` FOREIGN KEY (\`conferenceId\`) REFERENCES \`conferences\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`decisions\` DROP FOREIGN KEY \`FK_970b1b0f22038bfb48aeb65b6ed\``);
  }
}
