import type { DataSource } from 'typeorm';

/**
 * The text of a migration that makes the schema what the entities say, up and down.
 *
 * @param what what it does, in words joined by dashes
 * @param tables only statements about these tables; empty for all
 * @param now its place among the migrations
 */
export async function draftMigration(
  dataSource: DataSource,
  what: string,
  tables: readonly string[],
  now: Date,
): Promise<{ file: string; text: string }> {
  const { upQueries, downQueries } = await dataSource.driver.createSchemaBuilder().log();
  const wanted = ({ query }: { query: string }) => tables.length === 0 || tables.includes(tableOf(query));
  const up = upQueries.filter(wanted).map(({ query }) => statement(query));
  const down = downQueries.filter(wanted).map(({ query }) => statement(query));
  const className = what.replace(/(?:^|-)(\w)/g, (_, letter: string) => letter.toUpperCase());
  const stamp = now.toISOString().replace(/\D/g, '').slice(0, 12);
  const text = `import type { MigrationInterface, QueryRunner } from 'typeorm';

export class ${className}${now.getTime()} implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
${up.join('\n')}
  }

  async down(runner: QueryRunner): Promise<void> {
${down.reverse().join('\n')}
  }
}
`;
  return { file: `${stamp}-${what}.ts`, text };
}

const tableOf = (query: string) => /(?:table|on) `(\w+)`/i.exec(query)?.[1] ?? '';
const statement = (query: string) => `    await runner.query(\n      ${JSON.stringify(query)},\n    );`;
