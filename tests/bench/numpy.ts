/** The same job written with numpy, single thread, where the system's Python has it. */
import { spawnSync } from "node:child_process";
import path from "node:path";

/**
 * Runs a script that prints one JSON object.
 * @param script - beside this file
 * @returns what it printed, or undefined where there is no Python or no numpy
 */
export function withNumpy<Printed>(script: string): Printed | undefined {
  const threads = Object.fromEntries(["OMP", "OPENBLAS", "MKL"].map((each) => [`${each}_NUM_THREADS`, "1"]));
  const env = { ...process.env, ...threads };
  const hasNumpy = spawnSync("python3", ["-c", "import numpy"], { env }).status === 0;
  if (!hasNumpy) return undefined;
  const { status, stdout, stderr } = spawnSync("python3", [path.join(import.meta.dirname, script)], {
    env,
    encoding: "utf8",
  });
  if (status !== 0) throw new Error(`${script}: ${stderr}`);
  return JSON.parse(stdout) as Printed;
}
