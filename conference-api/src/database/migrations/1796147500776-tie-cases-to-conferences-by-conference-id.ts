import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieCasesToConferencesByConferenceId1796147500776 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`cases\` ADD CONSTRAINT \`FK_1f4d9febbc4ba01631569d6e110\` FOREIGN KEY (\`conferenceId\`) REFERENCES \`conferences\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP INDEX \`IDX_57f38e4851392a5536976fc9a9\` ON \`remarks\``);
  }
}
