import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieCaseImagesToCasesByCaseId1796147500793 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`case_images\` ADD CONSTRAINT \`FK_3bdb7a5b3290944a9aba8105ae5\` FOREIGN KEY (\`caseId\`) REFERENCES \`cases\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP INDEX \`IDX_6054d421b99b4ed7c550c7a1d9\` ON \`meetings\``);
  }
}
