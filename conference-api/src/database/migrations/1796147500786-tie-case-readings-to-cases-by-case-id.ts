import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieCaseReadingsToCasesByCaseId1796147500786 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`case_readings\` ADD CONSTRAINT \`FK_a235c86c23608c6898d95d2629b\` FOREIGN KEY (\`caseId\`) REFERENCES \`cases\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP INDEX \`IDX_2d63a1e8fd9c01780d479b16d5\` ON \`case_images\``);
  }
}
