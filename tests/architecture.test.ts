/** The layout's rules, read off the import lines. A rule that can be a test is one. */
import { existsSync, readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, test } from "vitest";

const root = process.cwd();
const layers = ["app", "components", "db", "lib", "seeds", "tests"];

interface Import {
  to: string;
  isType: boolean;
}
interface Source {
  file: string;
  text: string;
  imports: Import[];
}

/** The modules a file imports or exports from, `import type` told apart, dynamic imports included. */
function importsOf(text: string): Import[] {
  const named = [...text.matchAll(/^\s*(?:import|export)\s+(type\s)?(?:[^"'`;]*?\sfrom\s*)?["']([^"']+)["']/gm)];
  const dynamic = [...text.matchAll(/\bimport\(\s*["']([^"']+)["']/g)];
  return [
    ...named.map(([, type, to = ""]) => ({ to, isType: type !== undefined })),
    ...dynamic.map(([, to = ""]) => ({ to, isType: false })),
  ];
}

function filesUnder(folder: string): string[] {
  const entries = readdirSync(path.join(root, folder), { recursive: true, encoding: "utf8" });
  return entries.map((entry) => path.join(folder, entry)).filter((file) => /\.(ts|tsx|mjs)$/.test(file));
}

const sources: Source[] = layers.flatMap(filesUnder).map((file) => {
  const text = readFileSync(path.join(root, file), "utf8");
  return { file, text, imports: importsOf(text) };
});

/** What files that match import, of this project, as values. */
function breaches(from: (file: string) => boolean, isForbidden: (to: string, file: string) => boolean): string[] {
  return sources
    .filter(({ file }) => from(file))
    .flatMap(({ file, imports }) =>
      imports.filter(({ to, isType }) => !isType && isForbidden(to, file)).map(({ to }) => `${file} imports ${to}`),
    );
}

const within = (folder: string) => (file: string) => file.startsWith(`${folder}/`);
const isOwn = (to: string) => to.startsWith("@/") || to.startsWith(".");
const leadsTo =
  (...folders: string[]) =>
  (to: string) =>
    folders.some((folder) => to === `@/${folder}` || to.startsWith(`@/${folder}/`));
const isService = (name: string) => /(^|\/)service(\.ts)?$/.test(name);

test("The import lines are read: types apart, dynamic and side-effect imports too", () => {
  const text = `import "a";\nimport type { X } from "b";\nimport y, { z } from 'c';\nexport { q } from "d";\nexport type { r } from "e";
import {\n  one,\n  two,\n} from "f";\nconst g = await import("g");\nconst text = "import from nowhere";`;
  expect(importsOf(text)).toEqual([
    { to: "a", isType: false },
    { to: "b", isType: true },
    { to: "c", isType: false },
    { to: "d", isType: false },
    { to: "e", isType: true },
    { to: "f", isType: false },
    { to: "g", isType: false },
  ]);
});

describe("Dependencies point one way", () => {
  test("lib/line imports nothing but lib/line, packages included", () => {
    expect(breaches(within("lib/line"), (to) => !leadsTo("lib/line")(to))).toEqual([]);
  });

  test("only services, db, seeds and tests import db", () => {
    const mayImport = (file: string) =>
      isService(file) || ["db", "seeds", "tests"].some((folder) => within(folder)(file));
    expect(breaches((file) => !mayImport(file), leadsTo("db"))).toEqual([]);
  });

  test("components import no service, no db, no app", () => {
    expect(breaches(within("components"), (to) => leadsTo("db", "app", "seeds", "tests")(to) || isService(to))).toEqual(
      [],
    );
  });

  test("components import nothing that only the server may load", () => {
    const serverOnly = sources.filter(({ imports }) =>
      imports.some(({ to }) => to === "server-only" || to === "next/headers"),
    );
    const names = serverOnly.map(({ file }) => `@/${file.replace(/\.tsx?$/, "")}`);
    expect(names.length).toBeGreaterThan(0);
    expect(breaches(within("components"), (to) => names.includes(to))).toEqual([]);
  });

  test("lib imports no app and no components, and of the seeds only data", () => {
    const isSeedCode = (to: string) => leadsTo("seeds")(to) && !to.endsWith(".json");
    expect(breaches(within("lib"), (to) => leadsTo("app", "components", "tests")(to) || isSeedCode(to))).toEqual([]);
  });

  test("app imports no db and no seeds", () => {
    expect(breaches(within("app"), leadsTo("db", "seeds", "tests"))).toEqual([]);
  });

  test("components/ui knows no domain: it imports none of lib but text and numbers", () => {
    const domain = leadsTo("lib/line", "lib/cables", "lib/runs", "lib/team", "lib/auth", "lib/compute");
    expect(breaches(within("components/ui"), domain)).toEqual([]);
  });
});

test("Features call each other in no circle", () => {
  const featureOf = (name: string) => /^(?:@\/)?lib\/([^/]+)\//.exec(name)?.[1];
  const calls = new Map<string, Set<string>>();
  for (const { file, imports } of sources) {
    const from = featureOf(file);
    if (from === undefined || !isService(file)) continue;
    for (const { to, isType } of imports) {
      const target = featureOf(to);
      if (isType || target === undefined || target === from || !isService(to)) continue;
      calls.set(from, (calls.get(from) ?? new Set()).add(target));
    }
  }
  const circles: string[] = [];
  const follow = (feature: string, way: string[]): void => {
    if (way.includes(feature)) circles.push([...way, feature].join(" → "));
    else for (const next of calls.get(feature) ?? []) follow(next, [...way, feature]);
  };
  for (const feature of calls.keys()) follow(feature, []);
  expect(circles).toEqual([]);
});

test("No two files import each other's values, however far around", () => {
  const resolved = new Map(
    sources.map(({ file, imports }) => [file, imports.filter(({ isType }) => !isType).map(({ to }) => fileOf(to))]),
  );
  const done = new Set<string>();
  const circles: string[] = [];
  const follow = (file: string, way: string[]): void => {
    const start = way.indexOf(file);
    if (start >= 0) circles.push([...way.slice(start), file].join(" → "));
    if (start >= 0 || done.has(file)) return;
    for (const next of resolved.get(file) ?? []) if (next) follow(next, [...way, file]);
    done.add(file);
  };
  for (const file of resolved.keys()) follow(file, []);
  expect(circles).toEqual([]);
});

function fileOf(to: string): string | undefined {
  if (!to.startsWith("@/")) return undefined;
  const base = to.slice(2);
  return [base, `${base}.ts`, `${base}.tsx`].find((file) => /\.\w+$/.test(file) && existsSync(path.join(root, file)));
}

test("Our own files are imported through @/, never by a relative path", () => {
  expect(
    breaches(
      () => true,
      (to) => to.startsWith("."),
    ),
  ).toEqual([]);
});

test("Every import of our own leads to the file that defines the thing: no folders, no barrels", () => {
  expect(
    breaches(
      () => true,
      (to, file) => isOwn(to) && fileOf(to) === undefined && !within("tests")(file),
    ),
  ).toEqual([]);
  const barrels = sources.filter(
    ({ file }) => /(^|\/)index\.tsx?$/.test(file) && !/^(seeds|tests\/bench)\/index\.ts$/.test(file),
  );
  expect(barrels.map(({ file }) => file)).toEqual([]);
  const passingOn = sources
    .filter(({ text }) => /^export (\*|\{[^}]*\}) from "[@.]\//m.test(text))
    .map(({ file }) => file);
  expect(passingOn).toEqual([]);
});

test("There is no drawer: nothing is called utils, helpers, common, misc or types", () => {
  const drawers = sources.filter(({ file }) => /(^|\/)(utils?|helpers?|common|misc|types?)(\.tsx?|\/)/.test(file));
  expect(drawers.map(({ file }) => file)).toEqual([]);
});

test("Files are called in kebab-case", () => {
  const isKebab = (file: string) =>
    file
      .split("/")
      .slice(1)
      .every((part) => /^(\[{1,2}(\.{3})?[a-zA-Z]+\]{1,2}|\([a-z-]+\)|[a-z0-9]+(-[a-z0-9]+)*)(\.[a-z]+)*$/.test(part));
  expect(sources.map(({ file }) => file).filter((file) => !isKebab(file))).toEqual([]);
});

test("No file of the product is longer than 200 lines", () => {
  const product = sources.filter(({ file }) => !file.startsWith("tests/"));
  const long = product
    .map(({ file, text }) => ({ file, lines: text.trimEnd().split("\n").length }))
    .filter(({ lines }) => lines > 200);
  expect(long).toEqual([]);
});

test("What is left to be done is an issue, not a note in the code; no test is skipped", () => {
  const own = sources.filter(({ file }) => file !== "tests/architecture.test.ts");
  expect(own.filter(({ text }) => /\b(TODO|FIXME|XXX)\b/.test(text)).map(({ file }) => file)).toEqual([]);
  expect(
    own.filter(({ text }) => /\b(test|it|describe)\.(skip|only|todo)\b/.test(text)).map(({ file }) => file),
  ).toEqual([]);
});
