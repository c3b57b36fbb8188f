import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieBallotsToPeopleByPersonId1796147500804 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`ballots\` ADD CONSTRAINT \`FK_54518e24eb5fffb869555e7e501\` FOREIGN KEY (\`personId\`) REFERENCES \`people\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP INDEX \`IDX_293fb886acf5655a9968135347\` ON \`ballots\``);
  }
}
