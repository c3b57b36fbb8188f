import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieCasesToPeopleByPresenterId1796149650247 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`cases\` ADD CONSTRAINT \`FK_952754419fb8a0848b5a7b1ad63\` FOREIGN KEY (\`presenterId\`) REFERENCES \`people\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`cases\` DROP FOREIGN KEY \`FK_952754419fb8a0848b5a7b1ad63\``);
  }
}
