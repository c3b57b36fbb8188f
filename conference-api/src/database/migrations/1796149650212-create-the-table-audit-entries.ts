import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableAuditEntries1796149650212 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`audit_entries\` (\`id\` bigint NOT NULL AUTO_INCREMENT, \`at\` datetime(3) NOT NULL, \`personId\` uuid NULL, \`action\` varchar(60) NOT NULL, \`recordKind\` varchar(40) NOT NULL, \`recordId\` varchar(64) NOT NULL, \`caseId\` uuid NULL, \`conferenceId\` uuid NULL, \`address\` varchar(64) NOT NULL DEFAULT '', \`details\` json NOT NULL, INDEX \`IDX_1bf5c5df61b4b3601e9d66bf46\` (\`personId\`, \`id\`), INDEX \`IDX_907e656815a8df81342d70e495\` (\`caseId\`, \`id\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`audit_entries\``);
  }
}
