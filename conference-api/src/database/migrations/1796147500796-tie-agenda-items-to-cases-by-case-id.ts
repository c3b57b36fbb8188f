import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieAgendaItemsToCasesByCaseId1796147500796 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`agenda_items\` ADD CONSTRAINT \`FK_24fd925813c8f4dedd8af361923\` FOREIGN KEY (\`caseId\`) REFERENCES \`cases\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP INDEX \`IDX_b228655531512a51f5126f7027\` ON \`agenda_items\``);
  }
}
