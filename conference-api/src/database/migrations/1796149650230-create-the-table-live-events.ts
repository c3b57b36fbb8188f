import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateTheTableLiveEvents1796149650230 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE \`live_events\` (\`id\` bigint NOT NULL AUTO_INCREMENT, \`at\` datetime(3) NOT NULL, \`kind\` varchar(30) NOT NULL, \`conferenceId\` uuid NULL, \`caseId\` uuid NULL, \`meetingId\` uuid NULL, \`personId\` uuid NULL, \`actorId\` uuid NULL, INDEX \`IDX_af83ac7d3bd8a526bee34b094a\` (\`at\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE \`live_events\``);
  }
}
