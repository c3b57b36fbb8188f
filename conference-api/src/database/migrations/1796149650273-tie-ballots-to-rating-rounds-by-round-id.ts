import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieBallotsToRatingRoundsByRoundId1796149650273 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`ballots\` ADD CONSTRAINT \`FK_b648e4d839b3b6057b4eb2aae85\` FOREIGN KEY (\`roundId\`) REFERENCES \`rating_rounds\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`ballots\` DROP FOREIGN KEY \`FK_b648e4d839b3b6057b4eb2aae85\``);
  }
}
