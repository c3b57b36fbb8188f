import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieCasesToPeopleByPresenterId1796147500777 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`cases\` ADD CONSTRAINT \`FK_952754419fb8a0848b5a7b1ad63\` FOREIGN KEY (\`presenterId\`) REFERENCES \`people\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP INDEX \`IDX_e0f026afd5a88d0640971c6bbc\` ON \`remarks\``);
  }
}
