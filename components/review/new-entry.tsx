"use client";

import { Sources } from "@/components/cables/sources";
import { fieldWords, valueClass } from "@/components/review/field-words";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import { fieldsOfBoth } from "@/lib/cables/revisions/differences";
import type { CableRevision } from "@/lib/cables/revisions/schema";

const lossAtHz = 100e6;

/** An entry that nothing stands before: every field as it is, and where its figures came from. */
export function NewEntry({ revision }: { revision: CableRevision }) {
  const fields = fieldsOfBoth(revision, revision, lossAtHz).filter(
    ({ field, after }) => after !== null && !field.startsWith("figure."),
  );
  return (
    <>
      <div className="overflow-x-auto">
        <Table>
          <thead>
            <tr>
              <HeadCell>New entry</HeadCell>
              <HeadCell isRight>Revision {revision.revision}</HeadCell>
              <HeadCell aria-label="Unit" />
            </tr>
          </thead>
          <tbody>
            {fields.map((field) => {
              const { name, after, unit } = fieldWords(field, lossAtHz);
              return (
                <tr key={field.field}>
                  <RowHead>{name}</RowHead>
                  <Cell isRight className={valueClass(field.after)}>
                    {after}
                  </Cell>
                  <Cell className="unit pl-2">{unit}</Cell>
                </tr>
              );
            })}
          </tbody>
        </Table>
      </div>
      <Sources cable={revision} />
    </>
  );
}
