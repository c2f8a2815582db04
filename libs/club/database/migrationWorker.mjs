// Applies pending migrations away from the main thread, which then never holds the engine's memory.
import { parentPort, workerData } from 'node:worker_threads';
import { applyMigrations } from './schemaEngine.mjs';

const { file, migrationsFolder, schema } = workerData;
parentPort.postMessage(await applyMigrations(file, migrationsFolder, schema));
