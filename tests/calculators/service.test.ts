import { expect, test } from "vitest";
import { attenuationInputs } from "@/lib/calculators/attenuation";
import { padInputs } from "@/lib/calculators/pad";
import { openCalculator } from "@/lib/calculators/service";
import { addCable } from "@/tests/support/cables";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, other } from "@/tests/support/people";

withDatabase(async () => {
  await addPeople();
  addCable({ id: "a-first" });
  addCable({ id: "b-preferred", preferred: true });
  addCable({ id: "c-draft", state: "draft" });
  addCable({ id: "d-quarantined", state: "quarantined" });
  addCable({ id: "e-elsewhere", team: other });
});

const open = (parameters = {}, who = actor("designer")) => openCalculator(who, attenuationInputs, parameters);

test("without a cable in the address a preferred one stands there, else the first, else a typed one", () => {
  expect(open()).toMatchObject({ texts: { cable: "b-preferred" }, line: { designation: "B-PREFERRED" }, notes: [] });
  expect(open({}, actor("designer", other))).toMatchObject({ texts: { cable: "e-elsewhere" }, notes: [] });
  expect(open({}, actor("installer"))).toMatchObject({ texts: { cable: "typed" }, line: null, notes: [] });
});

test("the cable of the address is opened, even one that must not be used anew", () => {
  expect(open({ cable: "a-first" })).toMatchObject({ texts: { cable: "a-first" }, line: { cableId: "a-first" } });
  expect(open({ cable: "d-quarantined" })).toMatchObject({ line: { state: "quarantined" }, notes: [] });
});

test.each(["e-elsewhere", "c-draft", "nonesuch", ""])(
  "the cable %j is not for this person: it is said, and the usual one stands there",
  (cable) => {
    const opened = open({ cable });
    expect(opened).toMatchObject({ texts: { cable: "b-preferred" }, line: { cableId: "b-preferred" } });
    expect(opened.notes).toHaveLength(1);
  },
);

test("a typed cable is left as typed, and a calculator without a cable asks for none", () => {
  expect(open({ cable: "typed", z0: "93" })).toMatchObject({ texts: { cable: "typed", z0: "93" }, line: null });
  expect(openCalculator(actor("auditor"), padInputs, { loss: "6" })).toEqual({
    texts: { loss: "6", source: "50", load: "50", power: "1 W" },
    values: { loss: 6, source: 50, load: 50, power: 1 },
    notes: [],
    line: null,
  });
});
