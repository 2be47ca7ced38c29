import { defineConfig, globalIgnores } from "eslint/config";
import nextCoreWebVitals from "eslint-config-next/core-web-vitals";
import nextTypescript from "eslint-config-next/typescript";

const config = defineConfig([
  ...nextCoreWebVitals,
  ...nextTypescript,
  {
    rules: {
      "@typescript-eslint/no-unused-vars": [
        "error",
        { argsIgnorePattern: "^_", varsIgnorePattern: "^_", destructuredArrayIgnorePattern: "^_" },
      ],
      "no-console": ["error", { allow: ["error", "warn"] }],
      eqeqeq: ["error", "always", { null: "ignore" }],
    },
  },
  {
    files: ["app.mjs", "tests/run.mjs", "tests/bench/**", "db/migrate.ts", "seeds/index.ts"],
    rules: { "no-console": "off" },
  },
  globalIgnores([".next/**", "next-env.d.ts", "data/**", ".reports/**", "test-results/**", "drizzle/**"]),
]);

export default config;
