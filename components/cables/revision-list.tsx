import { stateWords } from "@/components/cables/words";
import { Section } from "@/components/ui/section";
import type { RevisionLine } from "@/lib/cables/revisions/schema";

interface Props {
  revisions: readonly RevisionLine[];
  current: number;
}

/** The history of an entry, the newest first. */
export function RevisionList({ revisions, current }: Props) {
  return (
    <Section title="Revisions">
      <ol className="text-label">
        {revisions.map(({ revision, reason, authorName, approvedByName, createdAt, approvedAt, state }) => (
          <li key={revision} className="grid grid-cols-[22px_1fr_auto] gap-2 border-b border-line py-1.25">
            <span className="figures text-ink-2">{revision}</span>
            <span>
              {reason}
              {revision === current && <span className="ml-1.5 text-note text-ink-3">the one shown</span>}
              <br />
              <span className="text-ink-2">
                {authorName}
                {approvedByName && `, approved by ${approvedByName}`}
                {!approvedByName && `, ${stateWords[state].word.toLowerCase()}`}
              </span>
            </span>
            <time dateTime={approvedAt ?? createdAt} className="text-ink-2">
              {(approvedAt ?? createdAt).slice(0, 10)}
            </time>
          </li>
        ))}
      </ol>
    </Section>
  );
}
