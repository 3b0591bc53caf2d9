import { defineConfig } from "drizzle-kit";

export default defineConfig({ dialect: "mysql", schema: "./src/schema/index.ts", out: "./migrations" });
