import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableMemberships1796149650214 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`memberships\` (\`conferenceId\` uuid NOT NULL, \`personId\` uuid NOT NULL, \`role\` varchar(20) NOT NULL, \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), PRIMARY KEY (\`conferenceId\`, \`personId\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`memberships\``);
  }
}
