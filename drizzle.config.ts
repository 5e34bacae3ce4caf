import { defineConfig } from 'drizzle-kit';

export default defineConfig({ dialect: 'turso', schema: './db/tables/*.ts', out: './drizzle' });
