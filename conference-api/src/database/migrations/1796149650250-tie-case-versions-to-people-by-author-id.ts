import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieCaseVersionsToPeopleByAuthorId1796149650250 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`case_versions\` ADD CONSTRAINT \`FK_a9a93e1fd03bcae734df74ac6ef\` FOREIGN KEY (\`authorId\`) REFERENCES \`people\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`case_versions\` DROP FOREIGN KEY \`FK_a9a93e1fd03bcae734df74ac6ef\``);
  }
}
