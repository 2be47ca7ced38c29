/**
 * Published loss tables and pair models as data for the fits. How far our one-term model is off from each stands in the
 * table below: it is part of what this file guarantees.
 */
import { describe, expect, test } from "vitest";
import { coaxGeometry } from "@/lib/line/geometry";
import { fitModel } from "@/lib/line/fit";
import { roundConductor } from "@/lib/line/conductor-shape";
import { fitLossTable, type LossRow } from "@/lib/line/loss-table";
import { agrees, number, published, type PublishedCheck } from "@/tests/support/published";

const foot = 0.3048;
const models = (choose: (id: string) => boolean) => published(choose, "published-models");
const at = (id: string) => models((each) => each === id)[0]!;

test.each(["B-mil-RG-58", "B-mil-RG-213"])("a table of two rows is met exactly, k1 and k2 as published: %s", (id) => {
  const check = at(id);
  const loss = check.inputs.max_dB_per_100ft as number[];
  const rows = (check.inputs.f_MHz as number[]).map((f, n) => ({
    frequency: f * 1e6,
    lossDbPerM: loss[n]! / (100 * foot),
  }));
  const { k1, k2, worstPercent } = fitLossTable(rows)!;
  agrees(check, { k1_dB_per_m_per_rootHz: k1, k2_dB_per_m_per_Hz: k2 });
  expect(worstPercent).toBeLessThan(1e-9);
});

interface Fitted {
  rows: LossRow[];
  z0: number;
  velocityFactor: number;
  r0: number;
}

/** Points of one published pair model, nominal figures from its highest frequency, dc resistance as its own. */
function pairModel(id: string): Fitted {
  const points = published((each) => each.startsWith(`${id}-`));
  const last = { ...points.at(-1)!.inputs, ...points.at(-1)!.expected };
  const perKm = "L_uH_per_km" in last;
  const l = perKm ? number(last, "L_uH_per_km") * 1e-9 : number(last, "L_nH_per_m") * 1e-9;
  const c = "C_nF_per_km" in last ? number(last, "C_nF_per_km") * 1e-12 : number(last, "C_pF_per_m") * 1e-12;
  const { params } = points[0]!.inputs as { params?: { r0c?: number; Rs0?: number } };
  const r0 = params?.Rs0 ?? (params?.r0c ?? number(points[0]!.inputs, "R_ohm_per_km")) / 1000;
  const rows = points.map(({ inputs, expected }) => ({
    frequency: number(inputs, "f_Hz"),
    lossDbPerM:
      "atten_dB_per_km" in expected
        ? number(expected, "atten_dB_per_km") / 1e3
        : number(expected, "atten_dB_per_100m") / 100,
  }));
  return { rows, z0: Math.sqrt(l / c), velocityFactor: 1 / (299_792_458 * Math.sqrt(l * c)), r0 };
}

const tableOf = ({ inputs, expected }: PublishedCheck, per: number, key: string): LossRow[] =>
  (inputs.f_MHz as number[]).map((f, n) => ({ frequency: f * 1e6, lossDbPerM: (expected[key] as number[])[n]! / per }));

/** A telephone pair: its wire is given, its impedance and velocity taken as usual for it. */
const telephonePair = (id: string): Fitted => ({
  rows: tableOf(at(id), 1000, "dB_per_km"),
  z0: 120,
  velocityFactor: 0.66,
  r0: 2 * roundConductor(number(at(id).inputs, "d_mm") * 1e-3).r0OhmPerM,
});

/** A category's limit as if it were a cable: two wires of 24 AWG, 100 Ω. */
const category = (id: string): Fitted => ({
  rows: tableOf(at(id), 100, "loss_dB"),
  z0: 100,
  velocityFactor: 0.66,
  r0: 0.1684,
});

function trunkCoax(id: string, inner: number, bore: number): Fitted {
  const { z0, r0, velocityFactor } = coaxGeometry({ inner, bore, permittivity: 1.085 });
  return { rows: tableOf(at(id), 1000, "dB_per_km"), z0, velocityFactor, r0 };
}

/**
 * Worst row of the refit, per cent of it, for a `round` and for a `sqrt` term. The 0.5 and 0.6 mm pairs are off at
 * 100 kHz, where the published fit holds a constant that no wire of that resistance has; the categories' limits are off
 * below 1 MHz and at 1 MHz, where they carry a part in 1/√f.
 */
const stated: [string, () => Fitted, { round: number; sqrt: number }][] = [
  ["C-bt-24AWG", () => pairModel("C-bt-24AWG"), { round: 2.26, sqrt: 2.62 }],
  ["C-bt-26AWG", () => pairModel("C-bt-26AWG"), { round: 2.19, sqrt: 3.71 }],
  ["C-bt-DWUG", () => pairModel("C-bt-DWUG"), { round: 2.03, sqrt: 3.57 }],
  ["C-bt-CAD55", () => pairModel("C-bt-CAD55"), { round: 0.51, sqrt: 2.46 }],
  ["C-khm-CAT5", () => pairModel("C-khm-CAT5"), { round: 0.09, sqrt: 0.12 }],
  ["C-khm-T05h", () => pairModel("C-khm-T05h"), { round: 0.13, sqrt: 0.28 }],
  ["C-khm-T05u", () => pairModel("C-khm-T05u"), { round: 0.61, sqrt: 0.2 }],
  ["C-khm-T05b", () => pairModel("C-khm-T05b"), { round: 0.0, sqrt: 1.03 }],
  ["C-reeve-24pic", () => pairModel("C-reeve-24pic"), { round: 2.76, sqrt: 0.91 }],
  ["C-pollakowski-0.35", () => telephonePair("C-pollakowski-0.35"), { round: 2.11, sqrt: 1.94 }],
  ["C-pollakowski-0.40", () => telephonePair("C-pollakowski-0.40"), { round: 2.35, sqrt: 3.33 }],
  ["C-pollakowski-0.50", () => telephonePair("C-pollakowski-0.50"), { round: 14.07, sqrt: 11.33 }],
  ["C-pollakowski-0.60", () => telephonePair("C-pollakowski-0.60"), { round: 22.24, sqrt: 18.52 }],
  ["A-cable-cat3", () => category("A-cable-cat3"), { round: 12.17, sqrt: 15.79 }],
  ["A-cable-cat5e", () => category("A-cable-cat5e"), { round: 8.6, sqrt: 6.38 }],
  ["A-cable-cat6", () => category("A-cable-cat6"), { round: 4.22, sqrt: 7.39 }],
  ["A-cable-cat6A", () => category("A-cable-cat6A"), { round: 4.58, sqrt: 7.55 }],
  ["A-cable-cat7", () => category("A-cable-cat7"), { round: 3.32, sqrt: 6.26 }],
  ["A-cable-cat7A", () => category("A-cable-cat7A"), { round: 5.0, sqrt: 8.49 }],
  ["A-cable-cat8", () => category("A-cable-cat8"), { round: 4.08, sqrt: 7.44 }],
  ["B-lnt-2.6-9.5", () => trunkCoax("B-lnt-2.6-9.5", 2.6e-3, 9.5e-3), { round: 1.04, sqrt: 0.21 }],
  ["B-lnt-1.2-4.4", () => trunkCoax("B-lnt-1.2-4.4", 1.2e-3, 4.4e-3), { round: 1.29, sqrt: 0.89 }],
];

describe("The refitted model is off from published data by what is stated", () => {
  test("and all of it is there", () => {
    const ids = [
      ...published((id) => /^C-(bt|khm|reeve)/.test(id)),
      ...models((id) => /^(C-poll|A-cable|B-lnt)/.test(id)),
    ];
    for (const { id } of ids)
      expect(
        stated.some(([name]) => id === name || id.startsWith(`${name}-`)),
        id,
      ).toBe(true);
  });

  test.each(stated)("%s", (_, data, worst) => {
    const { rows, ...known } = data();
    const got = (["round", "sqrt"] as const).map((form) => {
      const { refit } = fitModel({ ...known, rows, form });
      return Math.max(...rows.map(({ lossDbPerM }, n) => Math.abs(100 * (1 - refit.fittedDbPerM[n]! / lossDbPerM))));
    });
    expect(Math.abs(got[0]! - worst.round)).toBeLessThan(0.011);
    expect(Math.abs(got[1]! - worst.sqrt)).toBeLessThan(0.011);
  });
});
