import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableUnits1796149650215 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`units\` (\`id\` uuid NOT NULL, \`name\` varchar(120) NOT NULL, \`contactEmail\` varchar(254) NULL, \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), UNIQUE INDEX \`IDX_cd34e4bfea359fa09d997a0b87\` (\`name\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`units\``);
  }
}
