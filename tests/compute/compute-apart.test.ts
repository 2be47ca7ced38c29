import { monitorEventLoopDelay } from "node:perf_hooks";
import { afterEach, describe, expect, test, vi } from "vitest";
import { computeApart, computePartsApart } from "@/lib/compute/apart/compute-apart";
import { lineAnswer } from "@/lib/compute/answers";
import { computed } from "@/lib/compute/refuse";
import type { Circuit, LineModel } from "@/lib/line/element";
import { AppError } from "@/lib/http/errors";

const model: LineModel = {
  conductors: [{ form: "sqrt", r0OhmPerM: 0.0086, skinCornerRadPerS: 113_000 }],
  lInfHPerM: 1.96e-7,
  cFPerM: 7.85e-11,
  lossTangent: 1.5e-4,
};
const asked = { frequenciesHz: [1e6, 1e8, 1e9], temperatureC: 20 };
const read = (json: Uint8Array) => JSON.parse(new TextDecoder().decode(json)) as unknown;

/** Work for a second or more: many lines at many frequencies. */
const heavy = (): [Circuit, Parameters<typeof computeApart<"sweep">>[2]] => [
  {
    source: { kind: "constant", reOhm: 50, imOhm: 0 },
    elements: Array.from({ length: 200 }, () => ({ kind: "cable" as const, line: { model }, lengthM: 1 })),
    load: { kind: "constant", reOhm: 75, imOhm: 0 },
  },
  { startHz: 1e6, stopHz: 1e9, points: 10_001, spacing: "linear", temperatureC: 20, planes: [] },
];

afterEach(() => vi.useRealTimers());

describe("Computing in a thread of its own", () => {
  test("gives to the last digit what is computed here", async () => {
    expect(read(await computeApart("line", model, asked))).toEqual(
      JSON.parse(JSON.stringify(lineAnswer(model, asked))),
    );
  });

  test("answers many at once, each its own", async () => {
    const frequencies = Array.from({ length: 20 }, (_, i) => (i + 1) * 1e6);
    const answers = await Promise.all(
      frequencies.map((f) => computeApart("line", model, { frequenciesHz: [f], temperatureC: 20 })),
    );
    expect(answers.map((json) => (read(json) as { frequenciesHz: number[] }).frequenciesHz)).toEqual(
      frequencies.map((f) => [f]),
    );
  });

  test("tells what the engine refuses as a refusal, and goes on afterwards", async () => {
    const impossible = computeApart("line", model, { frequenciesHz: [-1], temperatureC: 20 });
    await expect(computed(impossible)).rejects.toMatchObject({ code: "invalid_input" });
    expect(read(await computeApart("line", model, asked))).toMatchObject({ frequenciesHz: asked.frequenciesHz });
  });

  test("keeps a fault of ours a fault of ours", async () => {
    const broken = computeApart("line", undefined as unknown as LineModel, asked);
    await expect(broken).rejects.toThrow(/TypeError/);
    await expect(broken).rejects.not.toBeInstanceOf(AppError);
  });

  test("leaves the thread that serves free while it works", async () => {
    await computeApart("line", model, asked);
    const delay = monitorEventLoopDelay({ resolution: 5 });
    delay.enable();
    await computeApart("sweep", ...heavy());
    delay.disable();
    expect(delay.max / 1e6).toBeLessThan(400);
  });

  test("ends what passes the deadline, says so, and computes the next", async () => {
    vi.useFakeTimers({ toFake: ["setTimeout", "clearTimeout"] });
    const endless = computeApart("sweep", ...heavy());
    const refused = expect(endless).rejects.toMatchObject({
      code: "invalid_input",
      message: "This takes more than 30 seconds; ask for less.",
    });
    vi.advanceTimersByTime(30_000);
    await refused;
    vi.useRealTimers();
    expect(read(await computeApart("line", model, asked))).toMatchObject({ frequenciesHz: asked.frequenciesHz });
  });
});

describe("An answer in parts", () => {
  const rows = (count: number) =>
    new TextEncoder().encode(
      `Type,Z0,VF,family\n${Array.from({ length: count }, (_, i) => `P${i},50,0.85,coax`).join("\n")}`,
    );
  const asked = { as: "csv", fileName: "x.csv" } as const;

  test("comes in order, whole, and each in a turn of its own", async () => {
    const seen: number[] = [];
    let turns = 0;
    const count = () => {
      turns++;
      if (seen.length < 2_000) setImmediate(count);
    };
    count();
    await computePartsApart(
      "importRows",
      (json) => {
        const part = read(json) as { rows?: { row: number }[] };
        seen.push(...(part.rows ?? []).map(({ row }) => row));
      },
      rows(2_000),
      asked,
    );
    expect(seen).toEqual(Array.from({ length: 2_000 }, (_, i) => i + 2));
    expect(turns).toBeGreaterThan(20);
  });

  test("ends where whoever takes it will have no more, with their reason; the next is computed", async () => {
    const refused = computePartsApart(
      "importRows",
      () => {
        throw new AppError("conflict", "No more.");
      },
      rows(2_000),
      asked,
    );
    await expect(refused).rejects.toMatchObject({ code: "conflict" });
    let parts = 0;
    await computePartsApart("importRows", () => parts++, rows(60), asked);
    expect(parts).toBe(3);
  });
});
