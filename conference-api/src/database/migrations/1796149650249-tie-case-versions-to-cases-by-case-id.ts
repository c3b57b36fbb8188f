import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieCaseVersionsToCasesByCaseId1796149650249 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`case_versions\` ADD CONSTRAINT \`FK_3d76d5e59dff36910e32bb5cf16\` FOREIGN KEY (\`caseId\`) REFERENCES \`cases\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`case_versions\` DROP FOREIGN KEY \`FK_3d76d5e59dff36910e32bb5cf16\``);
  }
}
