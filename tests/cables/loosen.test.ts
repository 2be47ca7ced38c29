import { expect, test } from "vitest";
import { readSearch, vocabulary } from "@/lib/cables/read-search";
import { loosenings } from "@/lib/cables/search/loosen";

const known = vocabulary(["foam", "braid", "foil"]);

test("a search that finds nothing names the word to leave out, the best loosening first", () => {
  const found = loosenings(readSearch("foam tripleshield 75 ohm ", known), ({ terms }) =>
    terms.some((term) => term.typed === "tripleshield") ? 0 : terms.length * 3,
  );
  expect(found).toEqual([{ without: "tripleshield", q: "foam 75 ohm", count: 6 }]);
});

test("a single word has nothing to leave out", () => {
  expect(loosenings(readSearch("tripleshield ", known), () => 9)).toEqual([]);
});
