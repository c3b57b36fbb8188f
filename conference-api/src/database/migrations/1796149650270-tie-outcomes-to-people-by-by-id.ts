import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieOutcomesToPeopleByById1796149650270 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`outcomes\` ADD CONSTRAINT \`FK_447e7ae1a89fcf7c445c4072577\` FOREIGN KEY (\`byId\`) REFERENCES \`people\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`outcomes\` DROP FOREIGN KEY \`FK_447e7ae1a89fcf7c445c4072577\``);
  }
}
