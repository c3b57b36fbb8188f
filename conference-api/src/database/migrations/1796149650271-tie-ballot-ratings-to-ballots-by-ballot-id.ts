import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieBallotRatingsToBallotsByBallotId1796149650271 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`ballot_ratings\` ADD CONSTRAINT \`FK_582ab5d13a8960cdf190de502bf\` FOREIGN KEY (\`ballotId\`) REFERENCES \`ballots\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`ballot_ratings\` DROP FOREIGN KEY \`FK_582ab5d13a8960cdf190de502bf\``);
  }
}
