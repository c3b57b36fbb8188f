import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableCaseReadings1796149650225 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`case_readings\` (\`personId\` uuid NOT NULL, \`caseId\` uuid NOT NULL, \`readUpTo\` datetime(3) NOT NULL, PRIMARY KEY (\`personId\`, \`caseId\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`case_readings\``);
  }
}
