import { Migrator } from '@mikro-orm/migrations';
import { defineConfig } from '@mikro-orm/postgresql';
import { SeedManager } from '@mikro-orm/seeder';
import { entities } from './entities/all';

// Applying migrations would rewrite the snapshot from what PostgreSQL reports, which words checks
// differently; the snapshot belongs to creating and checking only.
const applying = process.argv.includes('migration:up');

export default defineConfig({
  clientUrl: process.env.DATABASE_URL ?? 'postgresql://evenrun@127.0.0.1:5433/evenrun',
  entities,
  extensions: [Migrator, SeedManager],
  forceUtcTimezone: true,
  migrations: {
    path: './migrations',
    pathTs: './migrations',
    emit: 'ts',
    snapshot: !applying,
    snapshotName: '.snapshot-evenrun',
  },
  seeder: { path: './seeders', pathTs: './seeders', defaultSeeder: 'DemoSeeder' },
  pool: { min: 0, max: 10 },
});
