import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieBallotsToPeopleByPersonId1796149650274 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`ballots\` ADD CONSTRAINT \`FK_54518e24eb5fffb869555e7e501\` FOREIGN KEY (\`personId\`) REFERENCES \`people\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`ballots\` DROP FOREIGN KEY \`FK_54518e24eb5fffb869555e7e501\``);
  }
}
