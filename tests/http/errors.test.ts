import Sqlite from "better-sqlite3";
import { expect, test, vi } from "vitest";
import { problemOf } from "@/lib/http/errors";

test("A database held by somebody else is answered with 503 and when to try again", async () => {
  const answer = problemOf(new Sqlite.SqliteError("database is locked", "SQLITE_BUSY"));
  expect(answer.status).toBe(503);
  expect(answer.headers.get("Retry-After")).toBe("5");
  expect(await answer.json()).toMatchObject({ code: "busy", title: "Service Unavailable" });
});

test("A fault of ours is logged and answered with one sentence that tells nothing of it", async () => {
  const answer = problemOf(new Error("secret detail"));
  expect(answer.status).toBe(500);
  expect(await answer.text()).not.toContain("secret");
  expect(console.error).toHaveBeenCalledOnce();
  vi.mocked(console.error).mockClear();
});
