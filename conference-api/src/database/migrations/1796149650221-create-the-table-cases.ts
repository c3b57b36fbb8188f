import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableCases1796149650221 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`cases\` (\`id\` uuid NOT NULL, \`conferenceId\` uuid NOT NULL, \`code\` varchar(16) NOT NULL, \`presenterId\` uuid NOT NULL, \`treatingSurgeonId\` uuid NOT NULL, \`stage\` varchar(12) NOT NULL DEFAULT 'draft', \`title\` varchar(160) NOT NULL DEFAULT '', \`side\` varchar(8) NULL, \`joint\` varchar(8) NOT NULL DEFAULT 'hip', \`urgency\` varchar(8) NOT NULL DEFAULT 'routine', \`content\` json NOT NULL, \`searchText\` mediumtext NOT NULL, \`version\` int NOT NULL DEFAULT '1', \`returnRemark\` text NULL, \`withdrawnReason\` text NULL, \`withdrawnAt\` datetime(3) NULL, \`postedAt\` datetime(3) NULL, \`releasedAt\` datetime(3) NULL, \`releasedById\` uuid NULL, \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), \`updatedAt\` datetime(3) NOT NULL, FULLTEXT INDEX \`IDX_c1c53f4a266c9665a2b5fe08d7\` (\`searchText\`), INDEX \`IDX_6b66777ab050f476ad4ca6a7d2\` (\`presenterId\`, \`updatedAt\`), INDEX \`IDX_b3d270d0485f76609ee6cc85eb\` (\`conferenceId\`, \`stage\`, \`updatedAt\`), UNIQUE INDEX \`IDX_98e6b90c05490e40eed667d1a5\` (\`code\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`cases\``);
  }
}
