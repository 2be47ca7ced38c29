/** What a team has agreed on for its catalogue. Pure. */
import { z } from "zod";

export const houseRulesSchema = z
  .strictObject({
    isTwoPerson: z
      .boolean({ error: "Say true or false." })
      .describe("nobody approves or returns a revision of their own"),
    mayAdminsApprove: z.boolean({ error: "Say true or false." }).describe("false takes approval away from admins"),
    reviewMonths: z
      .int({ error: "The months are a whole number." })
      .min(1, { error: "At least one month." })
      .max(240, { error: "At most 240 months." })
      .describe("how long after its approval an entry is due for another look"),
  })
  .meta({ id: "HouseRules" });
export type HouseRules = z.infer<typeof houseRulesSchema>;

/** What holds where a team has said nothing else. */
export const usualRules: HouseRules = { isTwoPerson: true, mayAdminsApprove: true, reviewMonths: 36 };

/** When an entry approved at a time is due for another look, ISO 8601; the last day of a shorter month. */
export function reviewDueAt(approvedAt: string, { reviewMonths }: HouseRules): string {
  const due = new Date(approvedAt);
  const day = due.getUTCDate();
  due.setUTCMonth(due.getUTCMonth() + reviewMonths);
  if (due.getUTCDate() !== day) due.setUTCDate(0);
  return due.toISOString();
}
