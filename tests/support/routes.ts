/** Every route of the API as the server finds it: by walking the folder. */
import { readdirSync } from "node:fs";
import path from "node:path";
import type { Handler } from "@/lib/http/handle";
import type { Method } from "@/lib/http/operation";

export interface RouteFile {
  /** as in the description: /cables/{cableId} */
  path: string;
  handlers: Partial<Record<Method | "OPTIONS" | "HEAD", Handler>>;
}

const root = path.join(process.cwd(), "app/api/v1");

/** Every route file, imported; the one that answers for everything else is left out. */
export async function routeFiles(): Promise<RouteFile[]> {
  const files = readdirSync(root, { recursive: true, encoding: "utf8" }).filter(
    (file) => path.basename(file) === "route.ts",
  );
  const own = files.filter((file) => !file.includes("[[...")).sort();
  return Promise.all(
    own.map(async (file) => ({
      path: `/${path.dirname(file).replaceAll(/\[(\w+)\]/g, "{$1}")}`,
      handlers: (await import(path.join(root, file))) as RouteFile["handlers"],
    })),
  );
}
