/** What can be asked of a team. */
import { operation } from "@/lib/http/operation";
import { houseRulesSchema } from "@/lib/team/rules";

const answer = { status: 200, description: "The rules.", schema: houseRulesSchema, hasEntityTag: true } as const;

export const readHouseRules = operation({
  id: "readHouseRules",
  method: "GET",
  path: "/team/rules",
  summary: "What the team has agreed on for its catalogue.",
  permission: "team.readRules",
  answer,
});

export const changeHouseRules = operation({
  id: "changeHouseRules",
  method: "PATCH",
  path: "/team/rules",
  summary: "Change house rules; what is left out stays.",
  permission: "team.rules",
  body: houseRulesSchema.partial().meta({ id: "HouseRulesChange" }),
  needsMatch: true,
  answer,
});
