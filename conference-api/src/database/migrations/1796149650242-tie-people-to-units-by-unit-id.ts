import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TiePeopleToUnitsByUnitId1796149650242 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`people\` ADD CONSTRAINT \`FK_aefbb00a30026426f7b7d39f113\` FOREIGN KEY (\`unitId\`) REFERENCES \`units\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`people\` DROP FOREIGN KEY \`FK_aefbb00a30026426f7b7d39f113\``);
  }
}
