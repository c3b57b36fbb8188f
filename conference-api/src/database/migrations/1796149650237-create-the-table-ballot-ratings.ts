import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableBallotRatings1796149650237 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`ballot_ratings\` (\`ballotId\` uuid NOT NULL, \`optionId\` varchar(64) NOT NULL, \`value\` tinyint NOT NULL, PRIMARY KEY (\`ballotId\`, \`optionId\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`ballot_ratings\``);
  }
}
