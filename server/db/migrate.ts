import { readSettings } from '../config/settings.ts';
import { applyMigrations } from './apply-migrations.ts';

await applyMigrations(readSettings(process.env).databaseUrl);
