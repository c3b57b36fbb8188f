import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieSessionsToPeopleByPersonId1796149650244 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`sessions\` ADD CONSTRAINT \`FK_ef11cdece06d5c6a6c021fe9238\` FOREIGN KEY (\`personId\`) REFERENCES \`people\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`sessions\` DROP FOREIGN KEY \`FK_ef11cdece06d5c6a6c021fe9238\``);
  }
}
