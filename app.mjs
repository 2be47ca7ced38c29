// Starts Ropewalk: installs, migrates, seeds and builds what is missing or out of date, then serves it on this machine.
// Node's own modules only: on a fresh clone there is nothing else yet.
import { spawn, spawnSync } from "node:child_process";
import { existsSync, readdirSync, statSync } from "node:fs";
import path from "node:path";

const root = import.meta.dirname;
const port = Number(process.env.PORT || 3000);
if (!Number.isInteger(port) || port < 1 || port > 65535)
  stop(`PORT must be a whole number from 1 to 65535, not ${process.env.PORT}.`);
const address = `http://127.0.0.1:${port}`;
const environment = {
  ...process.env,
  PORT: String(port),
  DATABASE_FILE: path.resolve(process.env.DATABASE_FILE || path.join(root, "data", "ropewalk.db")),
  NEXT_TELEMETRY_DISABLED: "1",
};

function stop(message) {
  console.error(message);
  process.exit(1);
}

function run(what, command, args) {
  const { status, error } = spawnSync(command, args, { cwd: root, env: environment, stdio: "inherit" });
  if (status !== 0) stop(`${what} failed${error ? `: ${error.message}` : ""}.`);
}

const tool = (name) => path.join(root, "node_modules", ".bin", name);
const changedAt = (file) => statSync(path.join(root, file), { throwIfNoEntry: false })?.mtimeMs ?? 0;

/** When a file or anything under a folder last changed; a folder changes when something in it is removed. */
function newest(entry) {
  const full = path.join(root, entry);
  if (!existsSync(full)) return 0;
  const own = changedAt(entry);
  if (!statSync(full).isDirectory()) return own;
  return readdirSync(full).reduce((latest, name) => Math.max(latest, newest(path.join(entry, name))), own);
}

const sources = [
  "app",
  "components",
  "lib",
  "db",
  "public",
  "proxy.ts",
  "instrumentation.ts",
  "next.config.ts",
  "tsconfig.json",
];
const isBuilt = () =>
  existsSync(path.join(root, ".next/BUILD_ID")) &&
  [...sources, "postcss.config.mjs", "package-lock.json"].every(
    (entry) => newest(entry) <= changedAt(".next/BUILD_ID"),
  );

function prepare() {
  const installed = changedAt("node_modules/.package-lock.json");
  if (installed === 0 || installed < changedAt("package-lock.json")) run("Installing", "npm", ["ci"]);
  run("Migrating the database", tool("tsx"), ["--conditions=react-server", "db/migrate.ts"]);
  run("Seeding the database", tool("tsx"), ["--conditions=react-server", "seeds/index.ts"]);
  if (!isBuilt()) run("Building", tool("next"), ["build"]);
}

async function announce(server) {
  while (server.exitCode === null && server.signalCode === null) {
    const isUp = await fetch(`${address}/api/v1/health`).then(
      (answer) => answer.ok,
      () => false,
    );
    if (isUp) return console.log(`Ropewalk is at ${address}`);
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
}

prepare();
const server = spawn(
  process.execPath,
  ["node_modules/next/dist/bin/next", "start", "-H", "127.0.0.1", "-p", String(port)],
  { cwd: root, env: environment, stdio: "inherit" },
);
let isStopping = false;
for (const signal of ["SIGINT", "SIGTERM"])
  process.on(signal, () => {
    isStopping = true;
    server.kill(signal);
  });
server.on("exit", (code) => process.exit(isStopping ? 0 : (code ?? 1)));
await announce(server);
