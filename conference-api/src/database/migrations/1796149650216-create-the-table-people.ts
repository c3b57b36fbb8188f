import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTablePeople1796149650216 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`people\` (\`id\` uuid NOT NULL, \`email\` varchar(254) NOT NULL, \`name\` varchar(120) NOT NULL, \`discipline\` varchar(40) NOT NULL, \`unitId\` uuid NOT NULL, \`passwordHash\` varchar(255) NULL, \`isAdministrator\` tinyint NOT NULL DEFAULT 0, \`isActive\` tinyint NOT NULL DEFAULT 1, \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), UNIQUE INDEX \`IDX_c77e8752faa45901af2b245dff\` (\`email\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`people\``);
  }
}
