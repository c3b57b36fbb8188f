import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableMemberships1796147500744 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`memberships\` (\`conferenceId\` uuid NOT NULL, \`personId\` uuid NOT NULL, \`role\` varchar(20) NOT NULL, \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), PRIMARY KEY (\`conferenceId\`, \`personId\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP INDEX \`IDX_907e656815a8df81342d70e495\` ON \`audit_entries\``);
  }
}
