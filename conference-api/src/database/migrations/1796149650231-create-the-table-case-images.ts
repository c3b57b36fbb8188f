import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableCaseImages1796149650231 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`case_images\` (\`id\` uuid NOT NULL, \`caseId\` uuid NOT NULL, \`state\` varchar(10) NOT NULL, \`projection\` varchar(20) NOT NULL DEFAULT 'other', \`interval\` varchar(120) NOT NULL DEFAULT '', \`caption\` varchar(300) NOT NULL DEFAULT '', \`position\` int NOT NULL DEFAULT '0', \`width\` int NOT NULL DEFAULT '0', \`height\` int NOT NULL DEFAULT '0', \`bytes\` int NOT NULL DEFAULT '0', \`sourceKind\` varchar(20) NOT NULL, \`sourceHash\` char(64) NOT NULL, \`pixelSpacingMm\` double NULL, \`uploadedById\` uuid NOT NULL, \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), INDEX \`IDX_1473fd29e6b177495ccf0fd875\` (\`state\`, \`createdAt\`), INDEX \`IDX_2d63a1e8fd9c01780d479b16d5\` (\`caseId\`, \`position\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`case_images\``);
  }
}
