import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieRemarksToThreadsByThreadId1796149650258 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`remarks\` ADD CONSTRAINT \`FK_5f0a8ccc56f1bcda6ff796ba8b5\` FOREIGN KEY (\`threadId\`) REFERENCES \`threads\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`remarks\` DROP FOREIGN KEY \`FK_5f0a8ccc56f1bcda6ff796ba8b5\``);
  }
}
