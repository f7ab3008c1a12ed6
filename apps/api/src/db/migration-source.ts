/** Migrations and seeds as TypeScript files, found by Knex under the CLI, the server and the tests alike. */
import fs from 'node:fs/promises';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import type { Knex } from 'knex';

const filesOf = async (folder: string, pattern: RegExp): Promise<string[]> =>
  (await fs.readdir(folder)).filter((file) => pattern.test(file)).sort();

const load = async (folder: string, name: string): Promise<unknown> => {
  const file = (await fs.readdir(folder)).find((candidate) => candidate === `${name}.ts`);
  if (file === undefined) throw new Error(`No file ${name}.ts in ${folder}`);
  return import(/* @vite-ignore */ pathToFileURL(path.join(folder, file)).href);
};

/** Names are stored without the ending, so that a build can never make Knex think that a file is missing. */
export class TsMigrationSource implements Knex.MigrationSource<string> {
  constructor(private readonly folder: string) {}
  async getMigrations(): Promise<string[]> {
    return (await filesOf(this.folder, /^\d{14}_.+\.ts$/)).map((file) => file.replace(/\.ts$/, ''));
  }
  getMigrationName(name: string): string {
    return name;
  }
  async getMigration(name: string): Promise<Knex.Migration> {
    return (await load(this.folder, name)) as Knex.Migration; // a migration file exports up and down
  }
}

export class TsSeedSource implements Knex.SeedSource<string> {
  constructor(private readonly folder: string) {}
  async getSeeds(): Promise<string[]> {
    return (await filesOf(this.folder, /^\d{2}_.+\.ts$/)).map((file) => file.replace(/\.ts$/, ''));
  }
  async getSeed(name: string): Promise<Knex.Seed> {
    return (await load(this.folder, name)) as Knex.Seed; // a seed file exports seed
  }
}
