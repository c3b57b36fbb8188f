import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieAgendaItemsToCasesByCaseId1796149650266 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`agenda_items\` ADD CONSTRAINT \`FK_24fd925813c8f4dedd8af361923\` FOREIGN KEY (\`caseId\`) REFERENCES \`cases\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`agenda_items\` DROP FOREIGN KEY \`FK_24fd925813c8f4dedd8af361923\``);
  }
}
