import { outerDiameterMm } from "@/lib/cables/line";
import { enlargementFor } from "@/components/cables/section-parts";
import { cableShape, type DrawnCable } from "@/components/line/cable-shape";
import { SectionView } from "@/components/line/section-view";
import { RadialProfile } from "@/components/review/radial-profile";
import type { CableRevision } from "@/lib/cables/revisions/schema";
import { digits } from "@/lib/format/quantity";

const room = 132;

export function drawn({ construction, build, family }: CableRevision): DrawnCable {
  return { construction, build, family, outerDiameterMm: outerDiameterMm(construction) };
}

/** The size a section is known by: the dielectric's diameter, or the distance of the wires. */
function sizeOf({ construction }: CableRevision): { mm: number; name: string } | null {
  if (!construction) return null;
  return construction.kind === "coax"
    ? { mm: construction.dielectricMm, name: "dielectric" }
    : { mm: construction.spacingMm, name: "between the wires" };
}

function Section({ revision, mmToPx }: { revision: CableRevision; mmToPx: number }) {
  const size = sizeOf(revision);
  return (
    <figure className="flex flex-col items-center gap-1.5">
      <figcaption className="order-first text-label font-[640]">Revision {revision.revision}</figcaption>
      <SectionView {...drawn(revision)} mmToPx={mmToPx} box={room + 8} name={`Revision ${revision.revision}, end-on`} />
      {size && (
        <p className="text-label text-ink-2">
          {size.name} <b className="figures font-[650] text-ink">{digits(size.mm, 2)}</b>{" "}
          <span className="unit">mm</span>
        </p>
      )}
    </figure>
  );
}

/** Both revisions end-on at one scale, and cut open from the centre outwards. */
export function PairedSections({ before, after }: { before: CableRevision | null; after: CableRevision }) {
  const both = before ? [before, after] : [after];
  const outer = Math.max(1, ...both.map((each) => cableShape(drawn(each))?.outerMm ?? 0));
  const { mmToPx, ratio } = enlargementFor(outer, room);
  return (
    <div className="flex flex-wrap items-start justify-between gap-x-8 gap-y-5">
      <div className="flex flex-wrap gap-x-10 gap-y-4">
        {both.map((each) => (
          <Section key={each.revision} revision={each} mmToPx={mmToPx} />
        ))}
      </div>
      {before && (
        <div className="w-74 max-w-full min-w-0">
          <h3 className="mb-2 text-label">From the centre outwards</h3>
          <RadialProfile
            before={{ revision: before.revision, cable: drawn(before) }}
            after={{ revision: after.revision, cable: drawn(after) }}
          />
        </div>
      )}
      <p className="basis-full text-note text-ink-3">Sections {ratio} : 1 at 96 px to the inch.</p>
    </div>
  );
}
