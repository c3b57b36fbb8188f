import type { MigrationInterface, QueryRunner } from 'typeorm';

export class TieMembershipsToPeopleByPersonId1796149650241 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`memberships\` ADD CONSTRAINT \`FK_9b5139de55b7990de8ee069b8fc\` FOREIGN KEY (\`personId\`) REFERENCES \`people\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`memberships\` DROP FOREIGN KEY \`FK_9b5139de55b7990de8ee069b8fc\``);
  }
}
