/** Where drizzle-kit finds the schema and puts the migrations it generates: `npx drizzle-kit generate --name what-changes`. */
import { defineConfig } from 'drizzle-kit';

export default defineConfig({ dialect: 'postgresql', schema: './db/schema/*.ts', out: './drizzle' });
