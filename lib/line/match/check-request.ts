import type { MatchRequest } from "@/lib/line/match/match-request";
import { mostSections } from "@/lib/line/match/step-transformer";

/** @throws RangeError when a number of the request is out of its range */
export function checkRequest(request: MatchRequest): void {
  const { targetOhm, designHz, bandHz, returnLossDb, partQ } = request;
  requirePositive("targetOhm", targetOhm);
  requirePositive("designHz", designHz);
  requirePositive("bandHz from", bandHz[0]);
  requirePositive("bandHz to", bandHz[1]);
  if (bandHz[1] < bandHz[0]) throw new RangeError(`findMatches: bandHz must ascend, got ${bandHz[0]} to ${bandHz[1]}`);
  requirePositive("returnLossDb", returnLossDb);
  for (const name of ["rippleReturnLossDb", "networkQ", "notchHz"] as const) {
    const value = request[name];
    if (value !== undefined) requirePositive(name, value);
  }
  requirePlaces(request);
  if (partQ?.coilQ !== undefined) requirePositive("coilQ", partQ.coilQ);
  if (partQ?.capacitorQ !== undefined) requirePositive("capacitorQ", partQ.capacitorQ);
}

function requirePlaces({
  sections,
  spacingWavelengths,
  firstDistanceWavelengths,
  endAllowanceM = 0,
}: MatchRequest): void {
  if (sections !== undefined && !(sections >= 1 && sections <= mostSections && Number.isInteger(sections)))
    throw new RangeError(`findMatches: sections must be a whole number of 1 to ${mostSections}, got ${sections}`);
  if (spacingWavelengths !== undefined && !(spacingWavelengths > 0 && spacingWavelengths < 0.5))
    throw new RangeError(`findMatches: spacingWavelengths must be above 0 and under 0.5, got ${spacingWavelengths}`);
  if (firstDistanceWavelengths !== undefined && !(firstDistanceWavelengths >= 0 && firstDistanceWavelengths < 0.5))
    throw new RangeError(
      `findMatches: firstDistanceWavelengths must be 0 to under 0.5, got ${firstDistanceWavelengths}`,
    );
  if (!(endAllowanceM >= 0 && endAllowanceM < Infinity))
    throw new RangeError(`findMatches: endAllowanceM must be at least 0, got ${endAllowanceM}`);
}

function requirePositive(name: string, value: number): void {
  if (!(value > 0 && value < Infinity)) throw new RangeError(`findMatches: ${name} must be positive, got ${value}`);
}
