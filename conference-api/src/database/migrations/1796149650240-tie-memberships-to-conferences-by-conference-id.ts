import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieMembershipsToConferencesByConferenceId1796149650240 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`memberships\` ADD CONSTRAINT \`FK_f2406fa88009e250999cd5b0b55\` FOREIGN KEY (\`conferenceId\`) REFERENCES \`conferences\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`memberships\` DROP FOREIGN KEY \`FK_f2406fa88009e250999cd5b0b55\``);
  }
}
