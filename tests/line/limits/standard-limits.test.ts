import { describe, expect, test } from "vitest";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";
import { limitAt, marginTo, worstMargin } from "@/lib/line/limits/limit-line";
import { standardLimit, standardLimits } from "@/lib/line/limits/standard-limits";
import { agrees, number, published, type PublishedCheck } from "@/tests/support/published";

const checks = (choose: (id: string) => boolean) => published(choose, "published-models");
const frequencies = ({ inputs }: PublishedCheck) => (inputs.f_MHz as number[]).map((f) => f * 1e6);

/** A published check -> the limit it is about. */
const limitOf: Record<string, string> = {
  "A-cable-cat3": "cat3Cable",
  "A-cable-cat5e": "cat5eCable",
  "A-cable-cat6": "cat6Cable",
  "A-cable-cat6A": "cat6aCable",
  "A-cable-cat7": "cat7Cable",
  "A-cable-cat7A": "cat7aCable",
  "A-cable-cat8": "cat8Cable",
  "A-channel-classD": "classDChannel",
  "A-channel-classE": "classEChannel",
  "A-channel-classF": "classFChannel",
  "A-rl-5e-channel": "cat5eChannelReturnLoss",
  "A-rl-5e-permanent-link": "cat5eLinkReturnLoss",
  "A-rl-6-channel": "cat6ChannelReturnLoss",
  "A-rl-6-permanent-link": "cat6LinkReturnLoss",
  "A-rl-6A-channel": "cat6aChannelReturnLoss",
  "A-rl-5e-6-cable": "cat6CableReturnLoss",
};

describe("Limits are those published", () => {
  const all = checks((id) => /^A-(cable|channel|rl)/.test(id));

  test("and all of them are asked", () => expect(all.map(({ id }) => id).sort()).toEqual(Object.keys(limitOf).sort()));

  test.each(all.map((check) => [check.id, check] as const))("%s", (id, check) => {
    const limit = standardLimit(limitOf[id]!);
    const key = limit.quantity === "returnLoss" ? "return_loss_dB" : "loss_dB";
    // a published channel formula says where it may be asked beyond its class, and there is no limit there
    const within = frequencies(check).map((f) => limitAt(limit, f));
    const kept = within.map((_, k) => k).filter((k) => !Number.isNaN(within[k]!));
    expect(kept.length).toBeGreaterThan(0);
    const expected = { [key]: kept.map((k) => (check.expected[key] as number[])[k]!) };
    agrees({ ...check, expected }, { [key]: kept.map((k) => within[k]!) });
  });

  test("delay of a cable: 570, 545 and 538 ns for 100 m at 1, 10 and 100 MHz", () => {
    const [check] = checks((id) => id === "A-delay");
    agrees(check!, { delay_ns: frequencies(check!).map((f) => limitAt(standardLimit("cableDelay"), f) * 1e9) });
  });

  test("a thick Ethernet segment: 8.5 dB and a velocity factor of 0.77", () => {
    const [check] = checks((id) => id === "A-10base5");
    const length = number(check!.inputs, "segment_m");
    const delay = limitAt(standardLimit("thickEthernetDelay"), 1e7);
    agrees(check!, {
      VF: length / delay / SPEED_OF_LIGHT,
      loss_dB_at_10MHz: limitAt(standardLimit("thickEthernetLoss"), 1e7),
    });
  });
});

test("every limit names its standard, edition and source, whether it was seen, and a value where it applies", () => {
  expect(new Set(standardLimits.map(({ id }) => id)).size).toBe(standardLimits.length);
  for (const limit of standardLimits) {
    expect(limit.standard.length * limit.edition.length * limit.source.length, limit.id).toBeGreaterThan(0);
    expect(["text", "secondary", "memory"]).toContain(limit.seen);
    for (const { fromMhz, toMhz } of limit.pieces) {
      const middle = toMhz === Infinity ? 1e6 : Math.sqrt(fromMhz * toMhz) * 1e6;
      expect(limitAt(limit, middle), limit.id).toBeGreaterThan(0);
    }
  }
  expect(standardLimits.some(({ seen }) => seen === "memory")).toBe(true);
});

test("the stretches of a limit meet, to the tenth of a decibel that standards round to", () => {
  for (const limit of standardLimits)
    for (const [n, { toMhz, ...piece }] of limit.pieces.slice(0, -1).entries()) {
      const next = limit.pieces[n + 1]!;
      expect(next.fromMhz, limit.id).toBe(toMhz);
      const ends = [{ ...piece, toMhz }, next].map((each) => limitAt({ ...limit, pieces: [each] }, toMhz * 1e6));
      expect(Math.abs(ends[0]! - ends[1]!), limit.id).toBeLessThan(0.06);
    }
});

test("beyond a standard's range there is no limit, and no margin", () => {
  const limit = standardLimit("cat5eCable");
  expect(limitAt(limit, 101e6)).toBeNaN();
  expect(worstMargin(limit, [101e6, 2e8], [1, 2])).toBeUndefined();
  expect(() => limitAt(limit, 0)).toThrow(/limitAt: frequency must be positive/);
  expect(() => standardLimit("cat9Cable")).toThrow(/standardLimit: there is no limit cat9Cable/);
});

test("margins count inward: below a loss, above a return loss; the worst is where least is left", () => {
  const [loss, match] = [standardLimit("cat6Cable"), standardLimit("cat6ChannelReturnLoss")];
  expect(marginTo(loss, 100e6, 18.8)).toBeCloseTo(1, 9);
  expect(marginTo(match, 100e6, 11)).toBeCloseTo(-1, 9);
  expect(worstMargin(match, [1e6, 100e6, 250e6, 300e6], [30, 13, 7, 0])).toEqual({
    margin: expect.closeTo(-1.0206, 3) as number,
    frequency: 250e6,
  });
});
