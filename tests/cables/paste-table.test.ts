import { describe, expect, test } from "vitest";
import { readPastedTable, type PastedTable, type PasteRead } from "@/lib/cables/paste-table";
import { frequencyUnits, lossUnits, type FrequencyUnit, type LossUnit } from "@/lib/cables/pasting/units";
import fc from "@/tests/support/property";

function read(text: string, told = {}): PastedTable {
  const answer = readPastedTable(text, told);
  if (!answer.ok) throw new Error(answer.message);
  return answer.table;
}
function refused(text: string): Extract<PasteRead, { ok: false }> {
  const answer = readPastedTable(text);
  if (answer.ok) throw new Error(`read: ${answer.table.readAs}`);
  return answer;
}
const plain = (table: PastedTable) =>
  table.rows.map(({ frequencyHz, lossDbPerM }) => [frequencyHz, Number((lossDbPerM * 100).toPrecision(10))]);

describe("A table is read, and it says how", () => {
  test("tabs from a spreadsheet, units in the head", () => {
    const table = read("Frequency (MHz)\tAttenuation (dB/100 m)\n10\t1.94\n100\t6.28\n450\t11.92");
    expect(plain(table)).toEqual([
      [10e6, 1.94],
      [100e6, 6.28],
      [450e6, 11.92],
    ]);
    expect(table.readAs).toBe("3 rows read as frequency in MHz, loss in dB/100 m.");
    expect(table.rows[2]!.typed).toBe("11.92 dB/100 m at 450 MHz");
  });

  test.each([
    ["dB/100 ft", 0.5, 0.5 / 30.48],
    ["dB per 100 feet", 0.5, 0.5 / 30.48],
    ["dB/100ft", 0.5, 0.5 / 30.48],
    ["dB/km", 19.4, 0.0194],
    ["dB/1000 m", 19.4, 0.0194],
    ["Np/km", 2, 2 * 8.685889638065035e-3],
    ["dB/m", 0.05, 0.05],
  ])("%s", (unit, loss, dbPerM) => {
    const table = read(`GHz\t${unit}\n0.45\t${loss}\n1.5\t${loss * 2}`);
    expect(table.rows[0]!.frequencyHz).toBe(450e6);
    expect(table.rows[0]!.lossDbPerM / dbPerM).toBeCloseTo(1, 9);
  });

  test("decimal commas, with semicolons or tabs or spaces between", () => {
    for (const separator of [";", "\t", "  ", " "]) {
      const table = read(
        `MHz${separator === " " ? "  " : separator}dB/100 m\n10,5${separator}1,94\n100${separator}6,28`,
      );
      expect(plain(table)[0], JSON.stringify(separator)).toEqual([10.5e6, 1.94]);
      expect(table.readAs).toMatch(/decimal commas/);
    }
  });

  test("commas between columns, decimal points in them", () => {
    expect(plain(read("f/MHz,dB/100m\n10,1.94\n100,6.28"))).toEqual([
      [10e6, 1.94],
      [100e6, 6.28],
    ]);
  });

  test("thousands between commas or spaces where points are decimals", () => {
    expect(plain(read("MHz\tdB/100 m\n100\t6.28\n1,500\t26.18\n3 000\t38.48")).map(([f]) => f)).toEqual([
      100e6, 1.5e9, 3e9,
    ]);
  });

  test("units in the cells, each row its own", () => {
    const table = read("900 MHz\t19.85 dB/100 m\n1.5 GHz\t26.18 dB/100 m");
    expect(table.rows[1]!.frequencyHz).toBe(1.5e9);
    expect(table.readAs).toMatch(/frequency in the unit of each row/);
  });

  test("a line of frequencies over a line of losses, and a table in a text with bars", () => {
    expect(plain(read("MHz\t10\t100\t450\ndB/100 m\t1.94\t6.28\t11.92"))).toHaveLength(3);
    expect(plain(read("| MHz | dB/100 m |\n|---|---|\n| 10 | 1.94 |\n| 100 | 6.28 |"))).toHaveLength(2);
  });

  test("of metric and feet columns the metric one is taken; rows come in order, twins once, gaps are left out and said", () => {
    const table = read("MHz\tdB/100 ft\tdB/100 m\n100\t1.91\t6.28\n10\t0.59\t1.94\n10\t0.59\t1.94\n450\t-\t-");
    expect(plain(table)).toEqual([
      [10e6, 1.94],
      [100e6, 6.28],
    ]);
    expect(table.readAs).toMatch(/loss in dB\/100 m, 1 without a figure left out/);
  });

  test("a unit that somebody says settles what the table does not", () => {
    expect(plain(read("10\t1.94\n100\t6.28", { frequencyUnit: "MHz", lossUnit: "dB/100 m" }))).toHaveLength(2);
  });
});

describe("What cannot be told is refused with a sentence", () => {
  test("no unit of loss, no unit of frequency: it asks", () => {
    expect(refused("MHz\tdB\n10\t1.94\n100\t6.28")).toMatchObject({ asks: "lossUnit" });
    expect(refused("f\tdB/100 m\n10\t1.94\n100\t6.28")).toMatchObject({ asks: "frequencyUnit" });
    expect(refused("MHz\tdB/furlong\n10\t1.94").message).toMatch(/dB\/100 m or dB\/100 ft/);
  });
  test.each([
    ["nothing at all", "", /No row/],
    ["words", "see the data sheet", /No row/],
    ["a comma that may be a thousand", "MHz\tdB/100 m\n1,500\t26\n3,000\t38", /thousand or a decimal/],
    ["commas for both", "MHz,dB/100 m\n10,5,1,94\n100,0,6,28", /both between columns and in numbers/],
    ["a word among figures", "MHz\tdB/100 m\n10\t1.94\n100\tabout six\n450\t12", /Line 3: “about six”/],
    ["a loss below 0", "MHz\tdB/100 m\n10\t-1.94\n100\t-6.28", /Line 2.*above 0/],
    ["two losses at one frequency", "MHz\tdB/100 m\n10\t1.94\n10\t2.94", /Two rows of one frequency differ/],
    ["three columns without a head", "10\t1.94\t3\n100\t6.28\t4", /Which column is the loss/],
    ["two units in one head", "MHz\tdB/100 m or dB/100 ft\n10\t1.94\n100\t6", /several units of loss/],
    [
      "a thousand rows",
      `MHz\tdB/100 m\n${Array.from({ length: 1000 }, (_, i) => `${i + 1}\t1`).join("\n")}`,
      /at most 500/,
    ],
  ])("%s", (_, text, sentence) => expect(refused(text).message).toMatch(sentence));
});

test("whatever is pasted, it is read as positive figures in ascending order or refused in words, at once", () => {
  const piece = fc.constantFrom(
    "10",
    "1,5",
    "1.5",
    "\t",
    ";",
    ",",
    " ",
    "\n",
    "MHz",
    "GHz",
    "dB/100 m",
    "dB/100 ft",
    "Np/km",
    "-",
    "|",
    "1e9",
    "∞",
    "'",
  );
  const anything = fc.oneof(
    fc.string({ maxLength: 300 }),
    fc.array(piece, { maxLength: 60 }).map((parts) => parts.join("")),
  );
  fc.assert(
    fc.property(anything, (text) => {
      const answer = readPastedTable(text);
      expect(answer.ok || answer.message.length > 10).toBe(true);
      if (!answer.ok) return;
      const { rows } = answer.table;
      expect(rows.length).toBeGreaterThan(0);
      rows.forEach(({ frequencyHz, lossDbPerM }, i) => {
        expect(frequencyHz > (rows[i - 1]?.frequencyHz ?? 0) && lossDbPerM > 0 && lossDbPerM < Infinity).toBe(true);
      });
    }),
    { numRuns: 2000 },
  );
});

test("a table written in any unit, with any separator and any decimal sign, is read back", () => {
  const figure = fc.integer({ min: 1, max: 99_999 }).map((n) => n / 1000);
  fc.assert(
    fc.property(
      fc.uniqueArray(fc.tuple(figure, figure), { minLength: 4, maxLength: 30, selector: ([f]) => f }),
      fc.constantFrom(...(Object.keys(frequencyUnits) as FrequencyUnit[])),
      fc.constantFrom(...(Object.keys(lossUnits) as LossUnit[])),
      fc.constantFrom("\t", ";"),
      fc.constantFrom(".", ","),
      (rows, frequencyUnit, lossUnit, separator, point) => {
        const spelled = (value: number) => value.toFixed(4).replace(".", point);
        const lines = rows.map(([f, loss]) => `${spelled(f)}${separator}${spelled(loss)}`);
        const table = read(`${frequencyUnit}${separator}${lossUnit}\n${lines.join("\n")}`);
        const ordered = [...rows].sort(([a], [b]) => a - b);
        expect(table.rows).toHaveLength(rows.length);
        table.rows.forEach(({ frequencyHz, lossDbPerM }, i) => {
          expect(frequencyHz / (ordered[i]![0] * frequencyUnits[frequencyUnit])).toBeCloseTo(1, 9);
          expect(lossDbPerM / (ordered[i]![1] * lossUnits[lossUnit])).toBeCloseTo(1, 9);
        });
      },
    ),
    { numRuns: 300 },
  );
});

test("a hostile paste of a hundred thousand letters is refused or read within half a second", () => {
  for (const text of [
    "1".repeat(100_000),
    "1,".repeat(50_000),
    "1 000 ".repeat(16_000),
    "dB/".repeat(33_000),
    "\t".repeat(100_000),
  ]) {
    const start = performance.now();
    readPastedTable(text);
    expect(performance.now() - start).toBeLessThan(500);
  }
});
