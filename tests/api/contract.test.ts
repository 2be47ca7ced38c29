/** What holds on every route, whatever it is about: verbs, media types, sizes, origins, problem documents. */
import { describe, expect, test } from "vitest";
import * as catchAll from "@/app/api/v1/[[...rest]]/route";
import { GET as getCables } from "@/app/api/v1/cables/route";
import { POST as computeLine } from "@/app/api/v1/compute/line/route";
import { GET as getHealth } from "@/app/api/v1/health/route";
import { PATCH as patchRun } from "@/app/api/v1/runs/[runId]/route";
import { POST as createRun } from "@/app/api/v1/runs/route";
import { POST as signIn } from "@/app/api/v1/session/route";
import type { Method } from "@/lib/http/operation";
import { addCable, newRun } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, password } from "@/tests/support/people";
import { cookieOf, jsonOf, send } from "@/tests/support/requests";
import { routeFiles } from "@/tests/support/routes";

withDatabase(async () => {
  await addPeople();
  addCable({ id: "feeder" });
});
const designer = actor("designer");

test("Verbs that a route lacks are refused with 405 and the ones it has", async () => {
  const all: Method[] = ["GET", "POST", "PUT", "PATCH", "DELETE"];
  for (const { path, handlers } of await routeFiles()) {
    const own = all.filter((method) => handlers[method]?.operation);
    const allow = [...own, ...(own.includes("GET") ? ["HEAD"] : []), "OPTIONS"].join(", ");
    for (const method of all.filter((one) => !own.includes(one))) {
      const handler = handlers[method];
      const answer = handler && (await send(handler, method, { as: designer }));
      expect([answer?.status, answer?.headers.get("allow")], `${method} ${path}`).toEqual([405, allow]);
    }
    const options = handlers.OPTIONS && (await send(handlers.OPTIONS, "OPTIONS"));
    expect([options?.status, options?.headers.get("allow")]).toEqual([204, allow]);
  }
});

test("An address with nothing at it answers 404 to every verb, as a problem document", async () => {
  for (const method of ["GET", "POST", "PUT", "PATCH", "DELETE"] as const) {
    const answer = await send(catchAll[method], method);
    expect(answer.headers.get("content-type")).toBe("application/problem+json");
    expect(await jsonOf(answer, 404)).toMatchObject({ status: 404, title: "Not Found", detail: expect.any(String) });
  }
});

test("Health needs no sign-in", async () => {
  expect(await jsonOf(await send(getHealth, "GET"))).toEqual({ status: "ok" });
});

describe("A body", () => {
  const post = (sent: Parameters<typeof send>[2]) => send(createRun, "POST", { as: designer, ...sent });

  test.each([
    ["plain text", "text/plain"],
    ["a form", "application/x-www-form-urlencoded"],
    ["something like JSON", "application/jsonp"],
  ])("that is %s is refused with 415", async (_, type) => {
    expect((await post({ text: "{}", headers: { "content-type": type } })).status).toBe(415);
  });

  test("without a media type is refused with 415", async () => {
    const headers = { cookie: await cookieOf(designer), "sec-fetch-site": "same-origin" };
    const request = new Request("http://ropewalk.test/api/v1/runs", { method: "POST", headers });
    expect((await createRun(request, { params: Promise.resolve({}) })).status).toBe(415);
  });

  test("may name its character set", async () => {
    const type = { "content-type": "application/json; charset=utf-8" };
    expect((await post({ body: newRun("feeder"), headers: type })).status).toBe(201);
  });

  test.each([
    ["empty", ""],
    ["cut short", '{"name": "x"'],
    ["no JSON", "name=x"],
    ["not a number in JSON", '{"temperatureC": NaN}'],
    ["two documents", "{} {}"],
  ])("that is %s is refused with 400", async (_, text) => {
    expect((await post({ text })).status).toBe(400);
  });

  test("that is not UTF-8 is refused with 400", async () => {
    const headers = {
      cookie: await cookieOf(designer),
      "sec-fetch-site": "same-origin",
      "content-type": "application/json",
    };
    const body = Buffer.from('{"name":"\xff"}', "latin1");
    const request = new Request("http://ropewalk.test/api/v1/runs", { method: "POST", headers, body });
    expect((await createRun(request, { params: Promise.resolve({}) })).status).toBe(400);
  });

  test("of more than 1 MB is refused with 413, whether or not it says so beforehand", async () => {
    const text = JSON.stringify({ name: "x".repeat(1_048_600) });
    expect((await post({ text })).status).toBe(413);
    const headers = {
      cookie: await cookieOf(designer),
      "sec-fetch-site": "same-origin",
      "content-type": "application/json",
    };
    const body = new ReadableStream<Uint8Array>({
      pull: (controller) => controller.enqueue(new Uint8Array(65_536).fill(0x20)), // never ends
    });
    const init = { method: "POST", headers, body, duplex: "half" } as RequestInit;
    const request = new Request("http://ropewalk.test/api/v1/runs", init);
    expect((await createRun(request, { params: Promise.resolve({}) })).status).toBe(413);
  });

  test("is told all that is wrong with it at once, each at its path", async () => {
    const body = {
      ...newRun("feeder"),
      name: "",
      surprise: 1,
      bandHz: [2e6, 1e6],
      circuit: {
        source: { kind: "open" },
        elements: [
          { kind: "cable", line: { cableId: "feeder" }, lengthM: -1 },
          { kind: "cable", line: { model: { conductors: [], lInfHPerM: 1e-7, cFPerM: 0 } }, lengthM: "12 m" },
          { kind: "rope" },
          { kind: "pad", lossDb: 1, inputOhm: 75, outputOhm: 50 },
        ],
        load: { kind: "network", topology: "series" },
      },
    };
    const { errors, detail } = await jsonOf<{ detail: string; errors: { path: string; message: string }[] }>(
      await post({ body }),
      422,
    );
    expect(errors.map(({ path }) => path).sort()).toEqual([
      "bandHz",
      "circuit.elements.0.lengthM",
      "circuit.elements.1.lengthM",
      "circuit.elements.1.line.model.cFPerM",
      "circuit.elements.1.line.model.conductors",
      "circuit.elements.2.kind",
      "circuit.elements.3.lossDb",
      "circuit.load",
      "circuit.source.kind",
      "name",
      "surprise",
    ]);
    expect(detail).toBe("11 fields are not right.");
    for (const { message } of errors) expect(message).toMatch(/^[A-Z].*\.$/);
  });
});

describe("A change made with the cookie", () => {
  const from = async (headers: Record<string, string>) =>
    send(createRun, "POST", { body: newRun("feeder"), headers: { cookie: await cookieOf(designer), ...headers } });

  test.each<[string, Record<string, string>, number]>([
    ["our own page, by Sec-Fetch-Site", { "sec-fetch-site": "same-origin" }, 201],
    ["our own page, by Origin", { origin: "http://ropewalk.test" }, 201],
    ["our own page behind https", { origin: "https://ropewalk.test" }, 201],
    ["another site", { "sec-fetch-site": "cross-site" }, 403],
    ["another host of our site", { "sec-fetch-site": "same-site" }, 403],
    ["outside any page", { "sec-fetch-site": "none" }, 403],
    ["another origin", { origin: "http://elsewhere.test" }, 403],
    ["another port", { origin: "http://ropewalk.test:8080" }, 403],
    ["a sandboxed frame", { origin: "null" }, 403],
    ["another site that forges Origin only", { "sec-fetch-site": "cross-site", origin: "http://ropewalk.test" }, 403],
    ["nobody knows where", {}, 403],
  ])("from %s", async (_, headers, status) => {
    expect((await from(headers)).status).toBe(status);
  });

  test("is known by the Host header, as behind a proxy, and not by the address the server listens at", async () => {
    expect((await from({ host: "ropewalk.example", origin: "https://ropewalk.example" })).status).toBe(201);
    expect((await from({ host: "ropewalk.example", origin: "http://ropewalk.test" })).status).toBe(403);
  });

  test("is told apart from reading, which needs no origin", async () => {
    expect((await send(getCables, "GET", { headers: { cookie: await cookieOf(designer) } })).status).toBe(200);
  });
});

test("Who may is decided before the body is read", async () => {
  const broken = { text: "{", headers: { "content-type": "text/plain" } };
  expect((await send(createRun, "POST", broken)).status).toBe(401);
  expect((await send(createRun, "POST", { ...broken, as: actor("auditor") })).status).toBe(403);
  expect((await send(patchRun, "PATCH", { ...broken, as: designer, params: { runId: "none" } })).status).toBe(404);
});

describe("Signing in over HTTP", () => {
  const body = { email: designer.email, password };

  test("sets a cookie that another site's script cannot read or send along with a change", async () => {
    const answer = await send(signIn, "POST", { body });
    expect(answer.headers.get("set-cookie")).toMatch(/; HttpOnly; SameSite=Lax$/);
    expect(await jsonOf(answer)).toMatchObject({ role: "designer", person: { email: designer.email } });
  });

  test("is refused to a page of another site, which could sign a person in as somebody else", async () => {
    expect((await send(signIn, "POST", { body, headers: { origin: "http://elsewhere.test" } })).status).toBe(403);
  });

  test("answers the same for a wrong password and an unknown address", async () => {
    const wrong = await send(signIn, "POST", { body: { ...body, password: "no" } });
    const unknown = await send(signIn, "POST", { body: { ...body, email: "no@no.example" } });
    expect(await jsonOf(wrong, 401)).toEqual(await jsonOf(unknown, 401));
    expect(Object.fromEntries(wrong.headers)).toEqual(Object.fromEntries(unknown.headers));
  });

  test("takes the address in any case and with blanks around it", async () => {
    expect(
      (await send(signIn, "POST", { body: { ...body, email: `  ${designer.email.toUpperCase()} ` } })).status,
    ).toBe(200);
  });

  test("says when to come back after too many attempts", async () => {
    const guess = () => send(signIn, "POST", { body: { email: actor("admin").email, password: "guess" } });
    for (let i = 0; i < 10; i++) await guess();
    const answer = await guess();
    expect(answer.status).toBe(429);
    expect(Number(answer.headers.get("retry-after"))).toBeGreaterThan(0);
  });
});

describe("A hostile body", () => {
  const deep = (open: string, close: string) => open.repeat(100_000) + "1" + close.repeat(100_000);
  const run = JSON.stringify(newRun("feeder"));
  const cases: [string, string][] = [
    ["__proto__", '{"__proto__":{"role":"admin"}}'],
    ["__proto__ beside good fields", `{"__proto__":{"x":1},${run.slice(1)}`],
    ["constructor", '{"constructor":{"prototype":{"x":1}}}'],
    ["deep lists", `{"name":${deep("[", "]")}}`],
    ["deep objects", `{"circuit":${deep('{"a":', "}")}}`],
    [
      "deep elements",
      `{"name":"x","circuit":{"source":{"kind":"short"},"elements":${deep("[", "]")},"load":{"kind":"open"}}}`,
    ],
    ["a number beyond all bounds", run.replace('"temperatureC":20', '"temperatureC":1e999')],
    ["a number beyond the bounds of physics", run.replace('"temperatureC":20', '"temperatureC":1e308')],
    ["a list for an object", "[]"],
    ["null", "null"],
    ["text", '"run"'],
    ["a number", "42"],
    ["wrong types throughout", '{"name":1,"site":[],"circuit":"x","bandHz":{},"targets":7,"temperatureC":"20"}'],
    ["control characters", JSON.stringify({ name: "\u0000\u001b[31m", circuit: null })],
    ["a lone surrogate", '{"name":"\\ud800","circuit":null}'],
    ["many keys", JSON.stringify(Object.fromEntries(Array.from({ length: 40_000 }, (_, i) => [`k${i}`, 0])))],
    [
      "many elements",
      run.replace(
        /"elements":\[(.*?)\],"load"/,
        (_, one: string) => `"elements":[${`${one},`.repeat(300)}${one}],"load"`,
      ),
    ],
  ];

  test.each(cases)("of %s is refused as such", async (_, text) => {
    for (const handler of [createRun, computeLine, signIn]) {
      const { status } = await send(handler, "POST", { as: designer, text });
      expect(status).toBe(422);
    }
    expect(({} as { role?: string; x?: number }).role).toBeUndefined();
    expect(({} as { role?: string; x?: number }).x).toBeUndefined();
  });
});

test("No refusal shows how the server is built", async () => {
  const answer = await send(createRun, "POST", { as: designer, text: "{" });
  expect(await answer.text()).not.toMatch(/at |\.ts|node_modules|sqlite|zod/i);
});
