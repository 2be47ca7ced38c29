import { entityTag, requireMatch } from "@/lib/http/etag";
import { handle, route } from "@/lib/http/handle";
import { changeHouseRules, readHouseRules } from "@/lib/team/operations";
import type { HouseRules } from "@/lib/team/rules";
import { changeRules, getRules, rulesTag, staleRules } from "@/lib/team/rules/service";

const answer = (rules: HouseRules) => Response.json(rules, { headers: { ETag: entityTag(rulesTag(rules)) } });

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readHouseRules, ({ actor }) => answer(getRules(actor))),

  PATCH: handle(changeHouseRules, async ({ actor, request, body }) => {
    const before = getRules(actor);
    const tag = requireMatch(request, rulesTag(before), () => staleRules(before));
    return answer(changeRules(actor, tag, await body()));
  }),
});
