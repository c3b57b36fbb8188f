import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieCasesToPeopleByTreatingSurgeonId1796149650248 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`cases\` ADD CONSTRAINT \`FK_df37d81aa9393ca2e8a22b6a73d\` FOREIGN KEY (\`treatingSurgeonId\`) REFERENCES \`people\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`cases\` DROP FOREIGN KEY \`FK_df37d81aa9393ca2e8a22b6a73d\``);
  }
}
