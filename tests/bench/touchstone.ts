/** Reading files of network parameters: megabytes a second, and that the cost grows with the length only. */
import { readNetworkFile } from "@/lib/touchstone/read";
import { medianMs, ms, row, times } from "@/tests/bench/timing";

function twoPortFile(points: number): string {
  const lines = Array.from({ length: points }, (_, k) => {
    const angle = (-360 * k) / 997;
    return `${(1e6 + 1e4 * k).toFixed(0)} -31.254${k % 10} ${angle.toFixed(4)} -1.2345 12.345 -1.2345 12.345 -29.8 ${angle.toFixed(3)}`;
  });
  return `! two-port\n# Hz S DB R 50\n${lines.join("\n")}\n`;
}

export function benchTouchstone(): void {
  const [short, long] = [twoPortFile(20_000), twoPortFile(200_000)];
  const [shortMs, longMs] = [short, long].map((text) => medianMs(() => readNetworkFile("a.s2p", text), 5, 2));
  const rate = long.length / 1e6 / ((longMs ?? NaN) / 1000);
  row(
    `Network file of ${(long.length / 1e6).toFixed(0)} MB, 200,000 two-port points`,
    ms(longMs ?? NaN),
    `${rate.toFixed(0)} MB/s`,
  );
  row(
    "… ten times the points of a shorter one",
    ms(longMs ?? NaN),
    ms(shortMs ?? NaN),
    times((longMs ?? NaN) / (shortMs ?? NaN)),
  );
}
