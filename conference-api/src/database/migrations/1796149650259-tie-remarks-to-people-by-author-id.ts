import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieRemarksToPeopleByAuthorId1796149650259 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`remarks\` ADD CONSTRAINT \`FK_b9bb7106c9efa3b95c219338940\` FOREIGN KEY (\`authorId\`) REFERENCES \`people\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`remarks\` DROP FOREIGN KEY \`FK_b9bb7106c9efa3b95c219338940\``);
  }
}
