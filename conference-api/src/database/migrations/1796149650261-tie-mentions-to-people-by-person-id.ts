import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieMentionsToPeopleByPersonId1796149650261 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`mentions\` ADD CONSTRAINT \`FK_da6086454b0d1f12bd59723496c\` FOREIGN KEY (\`personId\`) REFERENCES \`people\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`mentions\` DROP FOREIGN KEY \`FK_da6086454b0d1f12bd59723496c\``);
  }
}
