import { describe, expect, test } from "vitest";
import { isMailAddress, oneLine, plainText } from "@/lib/mail/letter";
import fc from "@/tests/support/property";

describe("A line of a letter", () => {
  test("is one line, whatever is put into it", () => {
    fc.assert(
      fc.property(
        fc.string({ unit: "binary" }),
        fc.constantFrom("\r\n", "\n", "\r", "\u2028", "\u0085", "\0", "\v", "\u202e"),
        (a, end) => {
          expect(oneLine(`${a}${end}Bcc: x@y.example`, 1000)).not.toMatch(
            /[\p{Cc}\p{Zl}\p{Zp}\p{Cs}\p{Bidi_Control}]/u,
          );
        },
      ),
    );
    expect(oneLine("C50-F10\r\nBcc: everyone@quay.example", 200)).toBe("C50-F10 Bcc: everyone@quay.example");
  });

  test("is cut between characters and never within one", () => {
    expect(oneLine("⚓".repeat(10), 4)).toBe("⚓⚓⚓…");
    expect(oneLine("🪢".repeat(10), 4)).toBe("🪢🪢🪢…");
    expect(oneLine("🪢🪢", 2)).toBe("🪢🪢");
  });
});

test("The body keeps its lines and tabs and nothing else that steers", () => {
  expect(plainText("a\r\nb\rc\u2028d\u001b[31m\te\0", 100)).toBe("a\nb\nc\nd[31m\te");
});

describe("A mail address", () => {
  test.each(["ada@quay.example", "a.b+c@x-y.example", "ø@quay.example"])("%s is one", (text) => {
    expect(isMailAddress(text)).toBe(true);
  });

  test.each([
    ...["", "ada", "@quay.example", "ada@", "a@b@c.example", "a b@quay.example", "ada@quay.example, eve@quay.example"],
    ...[
      "ada@quay.example\r\nRCPT TO:<eve@quay.example>",
      "<ada@quay.example>",
      "ada@quay.example;",
      "Ada <a@b.example>",
    ],
    ...["ada@quay.example\0", `${"a".repeat(250)}@b.example`],
  ])("%j is none", (text) => {
    expect(isMailAddress(text)).toBe(false);
  });
});
