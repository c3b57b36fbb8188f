import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieMentionsToPeopleByPersonId1796147500791 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`mentions\` ADD CONSTRAINT \`FK_da6086454b0d1f12bd59723496c\` FOREIGN KEY (\`personId\`) REFERENCES \`people\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP INDEX \`IDX_59442bfb715b66763071c06da1\` ON \`meetings\``);
  }
}
