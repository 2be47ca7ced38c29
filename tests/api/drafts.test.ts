/** Drafts of cables over HTTP: who may, what is refused, and what comes of it. */
import { expect, test } from "vitest";
import { DELETE, GET as read } from "@/app/api/v1/cables/[cableId]/route";
import { GET as search, POST } from "@/app/api/v1/cables/route";
import { addCable, coaxModel } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, other } from "@/tests/support/people";
import { send } from "@/tests/support/requests";

withDatabase(async () => {
  await addPeople();
  addCable({ id: "feeder" });
});

const designer = actor("designer");
const cable = { designation: "N50-10", name: "50 Ω new feeder", family: "coaxial", model: coaxModel };

async function draft(designation: string, as = designer): Promise<{ id: string }> {
  const answer = await send(POST, "POST", { as, body: { ...cable, designation } });
  expect(answer.status).toBe(201);
  return (await answer.json()) as { id: string };
}

test("A designer drafts a cable, finds it by its words among the drafts, and takes it back", async () => {
  const { id } = await draft("N50-11");
  const found = await send(search, "GET", { as: designer, path: "/cables?q=new+feeder&state=draft" });
  expect(await found.json()).toMatchObject({ items: [{ id, state: "draft", revision: 1 }] });
  expect((await send(DELETE, "DELETE", { as: designer, params: { cableId: id } })).status).toBe(204);
  expect((await send(read, "GET", { as: designer, params: { cableId: id } })).status).toBe(404);
  const gone = await send(search, "GET", { as: designer, path: "/cables?q=new+feeder&state=draft" });
  expect(await gone.json()).toMatchObject({ total: 0 });
});

test("A draft is read by its author and the reviewers, and does not exist for another team", async () => {
  const { id } = await draft("N50-12", actor("librarian"));
  const status = async (as: ReturnType<typeof actor>) =>
    (await send(read, "GET", { as, params: { cableId: id } })).status;
  expect(await status(actor("librarian"))).toBe(200);
  expect(await status(actor("auditor"))).toBe(200);
  expect(await status(designer)).toBe(403);
  expect(await status(actor("designer", other))).toBe(404);
  expect((await send(DELETE, "DELETE", { as: designer, params: { cableId: id } })).status).toBe(403);
  expect((await send(DELETE, "DELETE", { as: actor("admin", other), params: { cableId: id } })).status).toBe(404);
});

test("A designation is given once in a team, and again in another", async () => {
  await draft("N50-13");
  const again = await send(POST, "POST", { as: designer, body: { ...cable, designation: " N50-13 " } });
  expect(again.status).toBe(409);
  expect(await again.json()).toMatchObject({ errors: [{ path: "designation", message: "Already in the catalogue." }] });
  expect(
    (await send(POST, "POST", { as: actor("designer", other), body: { ...cable, designation: "N50-13" } })).status,
  ).toBe(201);
});

test("An approved entry cannot be taken back", async () => {
  expect((await send(DELETE, "DELETE", { as: actor("librarian"), params: { cableId: "feeder" } })).status).toBe(409);
});

test.each([
  ["no designation", { designation: " " }, "designation"],
  ["an unknown family", { family: "waveguide" }, "family"],
  ["no model", { model: undefined }, "model"],
  ["a negative capacitance", { model: { ...coaxModel, cFPerM: -1 } }, "model.cFPerM"],
  ["a model without finite figures", { model: { ...coaxModel, lInfHPerM: 1e308, cFPerM: 1e308 } }, "model"],
  ["a key that is not one", { colour: "red" }, "colour"],
])("A draft with %s is refused at its place", async (_what, wrong, path) => {
  const answer = await send(POST, "POST", { as: designer, body: { ...cable, designation: "N50-99", ...wrong } });
  expect(answer.status).toBe(422);
  const { errors } = (await answer.json()) as { errors: { path: string }[] };
  expect(errors.map((error) => error.path)).toContain(path);
});
