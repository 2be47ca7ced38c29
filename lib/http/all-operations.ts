/** Every operation of the API, in the order of the description. */
import * as account from "@/lib/auth/operations";
import * as said from "@/lib/cables/comments/operations";
import * as cables from "@/lib/cables/operations";
import * as queue from "@/lib/cables/queue/operations";
import * as revisions from "@/lib/cables/revisions/operations";
import * as steps from "@/lib/cables/steps/operations";
import * as waivers from "@/lib/cables/waivers/operations";
import * as extract from "@/lib/compute/extract/operations";
import * as fit from "@/lib/compute/fit/operations";
import * as geometry from "@/lib/compute/geometry/operations";
import * as compute from "@/lib/compute/operations";
import * as readings from "@/lib/compute/readings/operations";
import * as touchstone from "@/lib/compute/touchstone/operations";
import * as service from "@/lib/http/operations";
import * as effects from "@/lib/runs/effects/operations";
import * as runs from "@/lib/runs/operations";
import * as team from "@/lib/team/operations";
import type { Operation } from "@/lib/http/operation";

const nouns = [
  account,
  team,
  cables,
  revisions,
  steps,
  said,
  waivers,
  queue,
  effects,
  runs,
  compute,
  geometry,
  fit,
  readings,
  extract,
  touchstone,
  service,
];

export const operations: Operation[] = nouns.flatMap((noun) => Object.values<Operation>(noun));
