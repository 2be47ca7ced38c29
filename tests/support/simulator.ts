/** Runs a transient of a circuit simulator where one is installed. */
import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";

export function simulatorInstalled(): boolean {
  try {
    execFileSync("ngspice", ["--version"], { stdio: "ignore" });
    return true;
  } catch {
    return false;
  }
}

/** Volts over time of the nodes asked, as the simulator's own steps fell. */
export interface Transient {
  timeS: number[];
  /** one list a node */
  volts: number[][];
}

/**
 * @param netlist - without title, control and end lines
 * @param nodes - names in the netlist
 * @param stepS - longest step, second
 * @param windowS - where it ends, second
 */
export function transient(netlist: string[], nodes: string[], stepS: number, windowS: number): Transient {
  const folder = mkdtempSync(path.join(tmpdir(), "transient-"));
  try {
    const out = path.join(folder, "out.txt");
    const written = [
      "a run and its drive",
      ...netlist,
      ".control",
      "set numdgt=12",
      `tran ${stepS} ${windowS} 0 ${stepS}`,
      `wrdata ${out} ${nodes.map((node) => `v(${node})`).join(" ")}`,
      "quit",
      ".endc",
      ".end",
    ];
    writeFileSync(path.join(folder, "run.cir"), written.join("\n"));
    execFileSync("ngspice", ["-b", path.join(folder, "run.cir")], { stdio: "ignore", cwd: folder });
    const rows = readFileSync(out, "utf8")
      .trim()
      .split("\n")
      .map((line) => line.trim().split(/\s+/).map(Number));
    return { timeS: rows.map((row) => row[0]!), volts: nodes.map((_, n) => rows.map((row) => row[2 * n + 1]!)) };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** A raised-cosine edge as a piecewise linear source between two nodes. */
export function raisedCosineSource(name: string, node: string, amplitudeV: number, riseS: number): string[] {
  const corners = Array.from({ length: 401 }, (_, n) => {
    const part = n / 400;
    return `${(part * riseS).toExponential(12)} ${((amplitudeV * (1 - Math.cos(Math.PI * part))) / 2).toExponential(12)}`;
  });
  return [`${name} ${node} 0 PWL(${corners[0]!}`, ...corners.slice(1).map((corner) => `+ ${corner}`), "+ )"];
}

/** Value at a time, on the straight line between the simulator's own steps. */
export function readTransient({ timeS }: Transient, volts: number[], at: number): number {
  const n = Math.max(
    1,
    timeS.findIndex((t) => t >= at),
  );
  const part = (at - timeS[n - 1]!) / (timeS[n]! - timeS[n - 1]!);
  return volts[n - 1]! + part * (volts[n]! - volts[n - 1]!);
}
