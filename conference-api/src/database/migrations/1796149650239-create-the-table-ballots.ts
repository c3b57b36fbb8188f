import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableBallots1796149650239 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`ballots\` (\`id\` uuid NOT NULL, \`roundId\` uuid NOT NULL, \`personId\` uuid NOT NULL, \`revision\` int NOT NULL, \`preferredOptionId\` varchar(64) NULL, \`reason\` text NOT NULL, \`at\` datetime(3) NOT NULL, \`supersededAt\` datetime(3) NULL, INDEX \`IDX_293fb886acf5655a9968135347\` (\`roundId\`, \`supersededAt\`), UNIQUE INDEX \`IDX_74851b426ee56c03726e4775ad\` (\`roundId\`, \`personId\`, \`revision\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`ballots\``);
  }
}
