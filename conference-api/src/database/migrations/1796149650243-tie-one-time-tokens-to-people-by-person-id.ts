import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieOneTimeTokensToPeopleByPersonId1796149650243 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`one_time_tokens\` ADD CONSTRAINT \`FK_fe7093c727c51189e572e017dea\` FOREIGN KEY (\`personId\`) REFERENCES \`people\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`one_time_tokens\` DROP FOREIGN KEY \`FK_fe7093c727c51189e572e017dea\``);
  }
}
