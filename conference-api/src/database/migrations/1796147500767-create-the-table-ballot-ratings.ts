import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableBallotRatings1796147500767 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`ballot_ratings\` (\`ballotId\` uuid NOT NULL, \`optionId\` varchar(64) NOT NULL, \`value\` tinyint NOT NULL, PRIMARY KEY (\`ballotId\`, \`optionId\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP INDEX \`IDX_ec7ccbb7b2ce96cb908298fb25\` ON \`decisions\``);
  }
}
