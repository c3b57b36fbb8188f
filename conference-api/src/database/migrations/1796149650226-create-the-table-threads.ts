import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableThreads1796149650226 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`threads\` (\`id\` uuid NOT NULL, \`caseId\` uuid NOT NULL, \`anchorKind\` varchar(10) NOT NULL, \`anchorRef\` varchar(64) NOT NULL DEFAULT '', \`kind\` varchar(10) NOT NULL, \`startedById\` uuid NOT NULL, \`answeredAt\` datetime(3) NULL, \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), INDEX \`IDX_f8729bbed4e8a0007d7155b044\` (\`caseId\`, \`createdAt\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`threads\``);
  }
}
