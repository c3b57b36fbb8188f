import 'reflect-metadata';
import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { DataSource } from 'typeorm';
import { readSettings, withEnvFile } from '../config/settings.js';
import { dataSourceOptions } from './data-source.js';

/*
 * Writes one migration for each statement that the entities ask for and the database lacks.
 * One statement each, since MariaDB commits at DDL: a migration that fails has done nothing.
 * Run it on a database on which all migrations have run; read and rename what it writes.
 */
const folder = join(process.cwd(), 'src/database/migrations');
const settings = readSettings(withEnvFile(process.env, '.env'));
const dataSource = await new DataSource(dataSourceOptions(settings.databaseUrl)).initialize();

/** A sentence for a statement: CreateTheTableCases, TieBallotsToPeople. */
function sentence(statement: string): string {
  const pascal = (text: string) => text.replace(/(^|_)([a-z])/g, (_, __, letter: string) => letter.toUpperCase());
  const table = pascal(/(?:TABLE|ON|INTO) `([^`]+)`/.exec(statement)?.[1] ?? 'Unknown');
  const column = pascal(/(?:ADD|DROP COLUMN|CHANGE) `([^`]+)`/.exec(statement)?.[1] ?? '');
  const target = pascal(/REFERENCES `([^`]+)`/.exec(statement)?.[1] ?? '');
  const key = pascal(/FOREIGN KEY \(`([^`]+)`\)/.exec(statement)?.[1] ?? '');
  if (/^CREATE TABLE/.test(statement)) return `CreateTheTable${table}`;
  if (/^DROP TABLE/.test(statement)) return `DropTheTable${table}`;
  if (target) return `Tie${table}To${target}By${key}`;
  if (/INDEX/.test(statement)) return `Index${table}`;
  if (column) return `Change${column}Of${table}`;
  return `Change${table}`;
}

const kebab = (text: string) => text.replace(/([a-z0-9])([A-Z])/g, '$1-$2').toLowerCase();
const literal = (text: string) => `\`${text.replace(/\\/g, '\\\\').replace(/`/g, '\\`').replace(/\$\{/g, '\\${')}\``;

/** The statement that takes one back; the builder's own list of them does not pair up with the others. */
function inverse(statement: string): string {
  const rules: [RegExp, string][] = [
    [/^CREATE TABLE (`[^`]+`)/, 'DROP TABLE $1'],
    [/^ALTER TABLE (`[^`]+`) ADD CONSTRAINT (`[^`]+`) FOREIGN KEY/, 'ALTER TABLE $1 DROP FOREIGN KEY $2'],
    [/^CREATE (?:UNIQUE |FULLTEXT )?INDEX (`[^`]+`) ON (`[^`]+`)/, 'DROP INDEX $1 ON $2'],
    [/^ALTER TABLE (`[^`]+`) ADD (?:UNIQUE |FULLTEXT )?INDEX (`[^`]+`)/, 'DROP INDEX $2 ON $1'],
    [/^ALTER TABLE (`[^`]+`) ADD (`[^`]+`)/, 'ALTER TABLE $1 DROP COLUMN $2'],
  ];
  for (const [pattern, replacement] of rules) {
    const match = pattern.exec(statement);
    if (match) return replacement.replace(/\$(\d)/g, (_, group: string) => match[Number(group)]!);
  }
  return "SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'write by hand how this one is taken back'";
}

const { upQueries } = await dataSource.driver.createSchemaBuilder().log();
const start = Date.now();
upQueries.forEach(({ query }, index) => {
  const name = sentence(query);
  const stamp = start + index;
  writeFileSync(
    join(folder, `${stamp}-${kebab(name)}.ts`),
    `import type { MigrationInterface, QueryRunner } from 'typeorm';

export class ${name}${stamp} implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(${literal(query)});
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(${literal(inverse(query))});
  }
}
`,
  );
});

const files = readdirSync(folder).filter((file) => file.endsWith('.ts')).sort();
const classes = files.map((file) => ({ file, name: /export class (\w+)/.exec(readFileSync(join(folder, file), 'utf8'))?.[1] ?? '' }));
writeFileSync(
  join(folder, '../migrations.ts'),
  `import type { MixedList } from 'typeorm';
${classes.map(({ file, name }) => `import { ${name} } from './migrations/${file.replace(/\.ts$/, '.js')}';`).join('\n')}

// Written by \`npm run migrations:generate\`: every migration, in the order they run.
export const MIGRATIONS: MixedList<Function> = [
${classes.map(({ name }) => `  ${name},`).join('\n')}
];
`,
);
console.log(`${upQueries.length} migrations written`);
await dataSource.destroy();
