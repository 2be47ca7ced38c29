/** First-load JavaScript of each page, gzipped, against what the framework itself loads for an empty page. Needs a build. */
import { spawn, spawnSync } from "node:child_process";
import { existsSync, mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { gzipSync } from "node:zlib";
import demo from "@/seeds/data/team.json";
import { demoPassword } from "@/lib/team/demo";
import { row, times } from "@/tests/bench/timing";

const port = 3977;
const base = `http://127.0.0.1:${port}`;
const pages = [
  "/sign-in",
  "/runs",
  "/runs/new",
  "/cables",
  "/notices",
  "/limits",
  "/cables/c50-f10",
  "/calculate",
  "/calculate/pad",
  "/calculate/stub",
  "/runs/mast-m2-telemetry",
  "/runs/mast-m2-telemetry/match",
];

const sizes = new Map<string, number>();
function gzipped(file: string): number {
  const known = sizes.get(file);
  if (known !== undefined) return known;
  const size = gzipSync(readFileSync(path.join(".next", file))).length;
  sizes.set(file, size);
  return size;
}

const scriptsOf = (html: string) => [
  ...new Set([...html.matchAll(/<script[^>]+src="\/_next\/(static\/[^"?]+\.js)/g)].map((match) => match[1]!)),
];
const total = (files: readonly string[]) => files.reduce((sum, file) => sum + gzipped(file), 0);

async function started(): Promise<void> {
  for (let i = 0; i < 100; i++) {
    const isUp = await fetch(`${base}/api/v1/health`).then(
      ({ ok }) => ok,
      () => false,
    );
    if (isUp) return;
    await new Promise((done) => setTimeout(done, 100));
  }
  throw new Error("the server did not start");
}

async function signIn(): Promise<string> {
  const body = JSON.stringify({ email: demo.people[0]!.email, password: demoPassword() });
  const headers = { "Content-Type": "application/json", Origin: base };
  const answer = await fetch(`${base}/api/v1/session`, { method: "POST", headers, body });
  return answer.headers.get("set-cookie")?.split(";")[0] ?? "";
}

export async function benchFirstLoad(): Promise<void> {
  if (!existsSync(".next/BUILD_ID")) return row("First-load JavaScript: no build yet, run `npm run build` first");
  const manifest = JSON.parse(readFileSync(".next/build-manifest.json", "utf8")) as {
    rootMainFiles: string[];
    polyfillFiles: string[];
  };
  const empty = total([...manifest.rootMainFiles, ...manifest.polyfillFiles]);
  const folder = mkdtempSync(path.join(tmpdir(), "ropewalk-bench-"));
  const env = {
    ...process.env,
    DATABASE_FILE: path.join(folder, "bench.db"),
    PORT: String(port),
    NEXT_TELEMETRY_DISABLED: "1",
  };
  for (const script of ["db/migrate.ts", "seeds/index.ts"])
    spawnSync("node_modules/.bin/tsx", ["--conditions=react-server", script], { env });
  const server = spawn("node", ["node_modules/next/dist/bin/next", "start", "-H", "127.0.0.1", "-p", String(port)], {
    env,
    stdio: "ignore",
  });
  try {
    await started();
    const cookie = await signIn();
    row("First-load JavaScript, gzipped: an empty page of the framework", `${(empty / 1024).toFixed(0)} kB`);
    for (const page of pages) {
      const html = await (await fetch(`${base}${page}`, { headers: page === "/sign-in" ? {} : { cookie } })).text();
      const size = total(scriptsOf(html));
      row(`  ${page}`, `${(size / 1024).toFixed(0)} kB`, "", times(size / empty));
    }
  } finally {
    server.kill();
    rmSync(folder, { recursive: true, force: true });
  }
}
