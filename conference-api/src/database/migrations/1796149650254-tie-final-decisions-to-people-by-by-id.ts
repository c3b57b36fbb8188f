import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieFinalDecisionsToPeopleByById1796149650254 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`final_decisions\` ADD CONSTRAINT \`FK_46c61f04d88ea4bfa25d8653fa9\` FOREIGN KEY (\`byId\`) REFERENCES \`people\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`final_decisions\` DROP FOREIGN KEY \`FK_46c61f04d88ea4bfa25d8653fa9\``);
  }
}
